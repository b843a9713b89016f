import { Button } from '@/components/ui/button'
import { ChoiceField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import { typedText, type FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { MoneyField, NumberField, TextField } from '@/components/ui/text-field'
import type { WhatIfDesk } from '@/lib/contracts/what-ifs'
import { offerWords } from '@/lib/messages/public'
import { whatIfWords as words } from '@/lib/messages/what-ifs'
import { paths } from '@/lib/paths'

type Props = { slug: string; desk: WhatIfDesk; form: FormState | undefined }

/** Names what would be different; what is left empty stays as planned. */
export function WhatIfForm({ slug, desk, form }: Props) {
  const { run, offers, suppliers } = desk
  const at = { ...(form && { form }) }
  return (
    <Sheet title={words.add} id="what-if">
      <Form
        action={paths.api.adminRunDeed(slug, run.id, 'what-ifs')}
        contract="whatIf"
        hidden={{ currency: run.currency }}
        {...at}
        foot={<Button>{words.add}</Button>}
      >
        <p className="max-w-words text-quiet">{words.addLead}</p>
        <TextField name="name" label={words.name} hint={words.nameHint} {...at} />
        <div className="flex flex-wrap items-end gap-4">
          {offers.map(({ offer }, i) => (
            <div key={offer}>
              <input type="hidden" name={`prices.${i}.offer`} value={offer} />
              <MoneyField
                name={`prices.${i}.priceMinor`}
                label={words.price(offerWords[offer])}
                currency={run.currency}
                optional
                {...at}
              />
            </div>
          ))}
          <NumberField name="units" label={words.units} optional {...at} />
          <NumberField name="yieldPercent" label={words.yield} unit="%" decimal optional {...at} />
        </div>
        {suppliers.length > 0 ? (
          <>
            <SelectField
              name="supplier"
              label={words.supplier}
              options={suppliers.map((name) => ({ value: name, label: name }))}
              empty={words.noSupplier}
              optional
              {...at}
            />
            <ChoiceField
              name="supplierDoes"
              label={words.supplierDoes}
              choices={[
                { value: 'left_out', label: words.leftOut },
                { value: 'prices', label: words.otherPrices },
              ]}
              chosen={typedText(form, 'supplierDoes')}
              optional
              {...at}
            />
            <NumberField
              name="supplierPercent"
              label={words.supplierPercent}
              hint={words.supplierPercentHint}
              unit="%"
              optional
              {...at}
            />
          </>
        ) : null}
      </Form>
    </Sheet>
  )
}
