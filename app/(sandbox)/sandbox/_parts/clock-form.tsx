import { When } from '@/components/format/when'
import { Button } from '@/components/ui/button'
import { DeedForm, Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { NumberField } from '@/components/ui/text-field'
import { sandboxWords } from '@/lib/messages/sandbox'

const words = sandboxWords.clock

/** Lets business time pass. */
export function ClockForm({ now, form }: { now: Date; form?: FormState }) {
  return (
    <>
      <p className="pb-4">
        {words.now} <When at={now.toISOString()} zone="UTC" />. {words.lead}
      </p>
      <Form action="/sandbox/clock" form={form} foot={<Button>{words.button}</Button>}>
        <NumberField name="advanceHours" label={words.hours} width="short" form={form} decimal />
      </Form>
      <div className="flex flex-wrap gap-3 pt-4">
        <DeedForm action="/sandbox/clock" hidden={{ advanceHours: '24' }}>
          <Button kind="secondary">{words.day}</Button>
        </DeedForm>
        <DeedForm action="/sandbox/clock" hidden={{ advanceHours: '168' }}>
          <Button kind="secondary">{words.week}</Button>
        </DeedForm>
      </div>
    </>
  )
}
