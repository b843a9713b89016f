import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { NumberField, TextField } from '@/components/ui/text-field'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; toMend?: readonly string[]; form?: FormState }

/** Begins a next version of the electronics. */
export function RevisionForm({ slug, module, toMend = [], form }: Props) {
  return (
    <Sheet title={words.beginRevision} id="begin-revision">
      <Form
        action={paths.api.adminModulePart(slug, module, 'revisions')}
        form={form}
        foot={<Button kind="secondary">{words.beginRevision}</Button>}
      >
        {toMend.length > 0 ? (
          <div className="max-w-words">
            <p className="font-semibold">{words.mustMend}</p>
            <ul className="ml-5 list-disc">
              {toMend.map((symptom) => (
                <li key={symptom}>{symptom}</li>
              ))}
            </ul>
          </div>
        ) : null}
        <TextField
          name="letter"
          label={words.letter}
          hint={words.letterHint}
          form={form}
          width="short"
          optional
        />
        <TextArea name="note" label={words.note} rows={3} form={form} optional />
        <div className="flex flex-wrap gap-4">
          <NumberField
            name="boardWidthMm"
            label={words.boardWidthMm}
            unit={words.millimetres}
            form={form}
            optional
          />
          <NumberField
            name="boardHeightMm"
            label={words.boardHeightMm}
            unit={words.millimetres}
            form={form}
            optional
          />
        </div>
      </Form>
    </Sheet>
  )
}
