import { Button, ButtonRow, LinkButton } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import type { ImportPreview } from '@/lib/contracts/part-import'
import { importWords as words } from '@/lib/messages/part-imports'
import { paths } from '@/lib/paths'
import { ChangesSheet } from './changes-sheet'
import { ImportTable } from './import-table'
import { MendForm } from './mend-form'
import { MistakesSheet } from './mistakes-sheet'
import { SettingsForm } from './settings-form'

type Props = { slug: string; module: string; preview: ImportPreview; form: FormState | undefined }

/** A file before it is saved: what would change first, then what is wrong, how it is read, and its lines. */
export function ImportSheets({ slug, module, preview, form }: Props) {
  const { id, kind, problems, lines, revision } = preview
  const canBeSaved = problems.length === 0 && lines > 0
  return (
    <>
      {canBeSaved && kind === 'lines' ? <ChangesSheet preview={preview} /> : null}
      <MistakesSheet preview={preview} />
      <ButtonRow>
        {canBeSaved ? (
          <DeedForm
            action={paths.api.adminModulePart(slug, module, 'parts/import/confirm')}
            hidden={{ import: id }}
          >
            <Button>{words.confirm(lines, kind === 'quotes')}</Button>
          </DeedForm>
        ) : null}
        <LinkButton kind="secondary" href={paths.adminPartImport(slug, module, { revision, kind })}>
          {words.anew}
        </LinkButton>
      </ButtonRow>
      <MendForm {...{ slug, module, preview }} />
      <SettingsForm {...{ slug, module, preview, form }} />
      <ImportTable preview={preview} />
    </>
  )
}
