import type { FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { NumberField } from '@/components/ui/text-field'
import type { OrderFormOffer, OrderFormView } from '@/lib/contracts/order-quote'
import { formatMoney } from '@/lib/core/money/format'
import { orderFormWords as words } from '@/lib/messages/orders'
import { offerWords } from '@/lib/messages/public'
import { LOCALE } from '@/lib/messages/ui'

type Props = { run: OrderFormView; offer: OrderFormOffer; index: number; form?: FormState }

/** One offer: how many of it, and its questions. */
export function OfferRow({ run, offer, index, form }: Props) {
  const name = offerWords[offer.offer]
  const sum = (minor: number) => formatMoney(minor, run.currency, LOCALE)
  const only = run.offers.length === 1
  return (
    <div className="flex flex-col gap-3">
      <input type="hidden" name={`lines.${index}.offer`} value={offer.offer} />
      <NumberField
        name={`lines.${index}.quantity`}
        label={words.quantity(name)}
        hint={words.offerLine(sum(offer.priceMinor), sum(offer.depositMinor), offer.postedBy)}
        error={form?.errors?.[`lines.${index}.quantity`] ?? form?.errors?.[`lines.${index}.offer`]}
        form={form}
        defaultValue={form ? undefined : only ? '1' : '0'}
        width="medium"
        required={false}
      />
      {offer.choices.map((choice) => (
        <SelectField
          key={choice.id}
          name={`lines.${index}.choices.${choice.id}`}
          label={words.choiceOf(name, choice.question)}
          hint={choice.askedAfterLock ? words.asksLater : undefined}
          form={form}
          defaultValue={form ? undefined : choice.answers.find(({ isDefault }) => isDefault)?.id}
          options={choice.answers.map(({ id, label, surchargeMinor }) => ({
            value: id,
            label: surchargeMinor > 0 ? words.surcharge(label, sum(surchargeMinor)) : label,
          }))}
          required={false}
        />
      ))}
    </div>
  )
}
