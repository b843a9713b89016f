import { AddressFields } from '@/components/order/address-fields'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { MoneyField, NumberField, TextField } from '@/components/ui/text-field'
import type { OrderFormView } from '@/lib/contracts/order-quote'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { orderFormWords } from '@/lib/messages/orders'
import { offerWords } from '@/lib/messages/public'

type Props = { action: string; run: OrderFormView; form?: FormState }

/** An order that was paid elsewhere, or is free: what, at which price, for whom, why. */
export function EnterForm({ action, run, form }: Props) {
  return (
    <Form
      action={action}
      form={form}
      hidden={{ currency: run.currency }}
      foot={<Button>{words.enterButton}</Button>}
    >
      <Sheet title={orderFormWords.what}>
        <div className="flex flex-col gap-6">
          {run.offers.map(({ offer }, i) => (
            <div key={offer} className="flex flex-col gap-3">
              <input type="hidden" name={`lines.${i}.offer`} value={offer} />
              <NumberField
                name={`lines.${i}.quantity`}
                label={orderFormWords.quantity(offerWords[offer])}
                form={form}
                defaultValue={form ? undefined : '0'}
                error={form?.errors?.[`lines.${i}.quantity`] ?? form?.errors?.[`lines.${i}.offer`]}
                required={false}
              />
              <MoneyField
                name={`lines.${i}.priceMinor`}
                label={words.enterPrice(offerWords[offer])}
                hint={words.enterPriceHint}
                currency={run.currency}
                form={form}
                defaultValue={form ? undefined : '0'}
                required={false}
              />
            </div>
          ))}
        </div>
      </Sheet>
      <Sheet title={words.enterWho}>
        <div className="flex flex-col gap-5">
          <TextField name="email" type="email" label={words.enterMail} form={form} />
          <AddressFields prefix="address." form={form} />
          <TextArea name="reason" label={words.enterReason} hint={words.enterReasonHint} form={form} />
        </div>
      </Sheet>
    </Form>
  )
}
