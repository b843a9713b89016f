import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Picture } from '@/components/ui/picture'
import { Sheet } from '@/components/ui/sheet'
import type { FileView } from '@/lib/contracts/files'
import { fileWords as words } from '@/lib/messages/files'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; files: readonly FileView[] }
const SUBJECTS = ['module', 'offer', 'revision', 'lesson'] as const

/** What is kept, by what it belongs to. */
export function FileLists({ slug, module, files }: Props) {
  if (files.length === 0) return <p className="text-quiet">{words.none}</p>
  return SUBJECTS.map((subject) => {
    const own = files.filter((file) => file.subject === subject)
    return own.length === 0 ? null : (
      <Sheet key={subject} title={words.subjects[subject]} id={subject}>
        <p className="pb-3 text-13 text-quiet">{words.seenBy[subject]}</p>
        <ul className="grid gap-6 sm:grid-cols-2 lg:grid-cols-3">
          {own.map((file) => (
            <li key={file.id} className="flex min-w-0 flex-col gap-2">
              <Shown file={file} />
              <p className="text-15 break-words">
                {file.of === '' ? null : (
                  <span className="font-semibold">{words.of(subject, file.of)}: </span>
                )}
                {file.alt}
              </p>
              <p className="text-13 text-quiet">{words.size(file.byteCount, file.role)}</p>
              <DeedForm
                action={paths.api.adminModulePart(slug, module, 'files/remove')}
                hidden={{ file: file.id }}
              >
                <Button kind="plain" aria-label={words.removeNamed(file.alt)}>
                  {words.remove}
                </Button>
              </DeedForm>
            </li>
          ))}
        </ul>
      </Sheet>
    )
  })
}

function Shown({ file }: { file: FileView }) {
  const src = paths.api.file(file.id)
  if (file.kind === 'picture')
    return <Picture src={src} alt={file.alt} width={file.widthPx ?? 1} height={file.heightPx ?? 1} />
  if (file.kind === 'sound')
    return <audio controls preload="none" src={src} aria-label={file.alt} className="w-full" />
  return <a href={src}>{file.fileName}</a>
}
