import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { DateField, NumberField, TextField } from '@/components/ui/text-field'
import { partWords as words } from '@/lib/messages/parts'
import { paths } from '@/lib/paths'

type Props = {
  slug: string
  module: string
  part: string
  today: string
  currency: string
  form: FormState | undefined
}

/** Writes down a quote. */
export function QuoteForm({ slug, module, part, today, currency, form }: Props) {
  const at = { ...(form && { form }) }
  return (
    <Sheet title={words.writeQuote} id="quote">
      <Form
        action={paths.api.adminModulePart(slug, module, 'parts/quotes')}
        contract="quote"
        hidden={{ part }}
        {...at}
        foot={<Button>{words.writeQuote}</Button>}
      >
        <TextField name="supplier" label={words.supplier} {...at} />
        <TextField name="supplierCode" label={words.supplierCode} optional {...at} />
        <TextField name="breaks" label={words.breaks} hint={words.breaksHint} {...at} />
        <div className="flex flex-wrap items-end gap-4">
          <TextField
            name="currency"
            label={words.currency}
            width="short"
            defaultValue={typedText(form, 'currency') ?? currency}
            {...at}
          />
          <NumberField name="setup" label={words.setup} hint={words.setupHint} decimal optional {...at} />
          <NumberField name="moq" label={words.moq} hint={words.moqHint} optional {...at} />
          <NumberField name="multiple" label={words.multiple} hint={words.multipleHint} optional {...at} />
          <NumberField name="leadDays" label={words.leadDays} optional {...at} />
          <NumberField name="stockSeen" label={words.stockSeen} optional {...at} />
          <DateField
            name="quotedOn"
            label={words.quotedOn}
            defaultValue={typedText(form, 'quotedOn') ?? today}
            max={today}
            {...at}
          />
        </div>
      </Form>
    </Sheet>
  )
}
