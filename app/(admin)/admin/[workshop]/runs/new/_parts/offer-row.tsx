import type { FormState } from '@/components/ui/form-state'
import { DateField, MoneyField } from '@/components/ui/text-field'
import type { OfferKind } from '@/lib/contracts/fields'
import { plainMoney } from '@/lib/core/money/plain'
import { runWords as words } from '@/lib/messages/runs'

type Props = {
  index: number
  offer: OfferKind
  priceMinor: number | null
  depositMinor: number | null
  currency: string
  form?: FormState
}

/** One offer of the run: its price and deposit start as the module's, its date is the promise. */
export function OfferRow({ index, offer, priceMinor, depositMinor, currency, form }: Props) {
  const name = (field: string) => `offers.${index}.${field}`
  // What was typed before stands first; the module's own sums are only a start.
  const start = (minor: number | null) =>
    form || minor === null ? {} : { defaultValue: plainMoney(minor, currency) }
  return (
    <div role="group" aria-label={words.offers[offer]} className="border-t border-rule py-3">
      <p className="pb-2 text-17 font-semibold">{words.offers[offer]}</p>
      <input type="hidden" name={name('offer')} value={offer} />
      <div className="flex flex-wrap gap-4">
        <MoneyField
          name={name('priceMinor')}
          label={words.price}
          currency={currency}
          {...start(priceMinor)}
          form={form}
        />
        <MoneyField
          name={name('depositMinor')}
          label={words.deposit}
          currency={currency}
          {...start(depositMinor)}
          form={form}
        />
        <DateField name={name('postedBy')} label={words.postedBy} optional form={form} />
      </div>
      {form?.errors?.[name('offer')] ? (
        <p className="pt-1 text-15 text-rust">{form.errors[name('offer')]}</p>
      ) : null}
    </div>
  )
}
