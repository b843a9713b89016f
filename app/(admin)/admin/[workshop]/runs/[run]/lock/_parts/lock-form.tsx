import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { TextArea } from '@/components/ui/text-area'
import { TextField } from '@/components/ui/text-field'
import { TypedConfirmation } from '@/components/ui/typed-confirmation'
import { atTypedRows } from '@/lib/contracts/run-forms'
import type { RunPage } from '@/lib/contracts/run-page'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import type { KeptForm } from '@/lib/queries/forms/get-form-draft'

type Kept = KeptForm | null
type Props = { page: RunPage; open: readonly { key: string; title: string }[]; kept: Kept }

/** The go: a reason for each line let pass, one for going below the minimum, and the words typed. */
export function LockForm({ page, open, kept }: Props) {
  const { workshop, id, module, figures, minimum, balanceWhen } = page
  const form = keptForm(kept && { ...kept, errors: atTypedRows(kept, 'waivers', 'reason') })
  return (
    <Form
      action={paths.api.adminRunDeed(workshop.slug, id, 'lock')}
      form={form}
      foot={<Button>{words.lockButton(figures.deposited)}</Button>}
    >
      {open.map(({ key, title }, index) => (
        <div key={key}>
          <input type="hidden" name={`waivers.${index}.key`} value={key} />
          <TextField
            name={`waivers.${index}.reason`}
            label={words.waive(title)}
            hint={words.waiveHint}
            optional
            form={form}
          />
        </div>
      ))}
      {figures.deposited < minimum ? (
        <TextArea name="reason" label={words.lockReason} hint={words.lockReasonHint} form={form} />
      ) : null}
      <p className="max-w-words">
        {words.lockSessions} {balanceWhen === 'at_lock' ? words.lockAsks : null}
      </p>
      <TypedConfirmation name="typed" words={words.confirmLock(module.slug)} form={form} />
    </Form>
  )
}
