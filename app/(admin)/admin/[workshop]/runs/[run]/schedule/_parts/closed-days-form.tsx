import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { writeClosedDays } from '@/lib/contracts/closed-days'
import { scheduleWords as words } from '@/lib/messages/schedule'

type Props = { action: string; days: readonly string[]; form: FormState | undefined }

/** The days on which the workshop itself does not work. */
export function ClosedDaysForm({ action, days, form }: Props) {
  return (
    <Sheet title={words.closed} id="closed-days">
      <Form
        action={action}
        {...(form && { form })}
        foot={<Button kind="secondary">{words.closedSave}</Button>}
      >
        <p className="max-w-words text-quiet">{words.closedLead}</p>
        <TextArea
          name="days"
          label={words.closedDays}
          hint={words.closedHint}
          rows={4}
          className="figures"
          defaultValue={typedText(form, 'days') ?? writeClosedDays(days)}
          optional
          {...(form && { form })}
        />
      </Form>
    </Sheet>
  )
}
