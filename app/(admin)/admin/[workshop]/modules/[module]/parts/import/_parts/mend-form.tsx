import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import type { ImportPreview } from '@/lib/contracts/part-import'
import { importWords as words } from '@/lib/messages/part-imports'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; preview: ImportPreview }

/** The file as text, to be mended on the spot and looked at again. */
export function MendForm({ slug, module, preview }: Props) {
  const { revision, kind, text } = preview
  if (text === '') return null
  return (
    <Sheet title={words.mend} id="mend">
      <Form
        action={paths.api.adminModulePart(slug, module, 'parts/import')}
        hidden={{ revision, kind }}
        foot={<Button kind="secondary">{words.lookAgain}</Button>}
      >
        <TextArea
          name="text"
          label={words.mendText}
          hint={words.mendHint}
          rows={14}
          className="figures max-w-none"
          spellCheck={false}
          wrap="off"
          defaultValue={text}
        />
      </Form>
    </Sheet>
  )
}
