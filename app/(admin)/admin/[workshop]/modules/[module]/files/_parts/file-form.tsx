import { Button } from '@/components/ui/button'
import { ChoiceField } from '@/components/ui/choice-field'
import { FileField } from '@/components/ui/file-field'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { TextField } from '@/components/ui/text-field'
import { DOCUMENT_ROLES, type FilesDesk } from '@/lib/contracts/files'
import { fileWords as words } from '@/lib/messages/files'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; desk: FilesDesk; form: FormState | undefined }

/** Sends a picture, a sound or a document. */
export function FileForm({ slug, module, desk, form }: Props) {
  const { revisions, offers, lessons } = desk
  const at = { ...(form && { form }) }
  const subjects = (['module', 'offer', 'revision', 'lesson'] as const).map((value) => ({
    value,
    label: words.subjectChoices[value],
  }))
  return (
    <Sheet title={words.add} id="add">
      <Form
        action={paths.api.adminModulePart(slug, module, 'files')}
        encType="multipart/form-data"
        {...at}
        foot={<Button>{words.add}</Button>}
      >
        <FileField
          name="file"
          label={words.file}
          hint={words.fileHint}
          accept="image/*,audio/*,application/pdf"
          {...at}
        />
        <TextField name="alt" label={words.alt} hint={words.altHint} width="full" {...at} />
        <ChoiceField
          name="subject"
          label={words.subject}
          choices={subjects}
          chosen={typedText(form, 'subject') ?? 'module'}
          {...at}
        />
        <div className="grid gap-4 sm:grid-cols-2">
          <SelectField
            name="offer"
            label={words.offer}
            options={offers.map((value) => ({ value, label: offerWords[value] }))}
            optional
            {...at}
          />
          <SelectField
            name="revision"
            label={words.revision}
            options={revisions.map((value) => ({ value, label: value }))}
            optional
            {...at}
          />
          <SelectField
            name="lesson"
            label={words.lesson}
            options={lessons.map(({ id, symptom }) => ({ value: id, label: symptom.slice(0, 80) }))}
            optional
            {...at}
          />
          <SelectField
            name="role"
            label={words.role}
            options={DOCUMENT_ROLES.map((value) => ({ value, label: words.roles[value] ?? value }))}
            optional
            {...at}
          />
        </div>
      </Form>
    </Sheet>
  )
}
