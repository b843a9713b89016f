import { Button } from '@/components/ui/button'
import { ChoiceField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import { type FormState, typedText } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { offerKind } from '@/lib/contracts/fields'
import { papers } from '@/lib/messages/papers'
import { unitWords as words } from '@/lib/messages/units'

/** A plain list of serial numbers, one a line. */
export function UnitForm({ action, form }: { action: string; form?: FormState }) {
  return (
    <Sheet title={words.add} id="add">
      <Form action={action} form={form} foot={<Button>{words.button}</Button>}>
        <ChoiceField
          name="offer"
          label={words.form}
          form={form}
          chosen={typedText(form, 'offer') ?? 'built'}
          choices={offerKind.options.map((value) => ({ value, label: papers.offers[value] }))}
        />
        <TextArea
          name="serials"
          label={words.serials}
          hint={words.hint}
          form={form}
          rows={8}
          className="figures"
        />
      </Form>
    </Sheet>
  )
}
