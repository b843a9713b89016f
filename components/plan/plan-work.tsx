import { RowsField, type RowColumn } from '@/components/forms/rows-field'
import { CheckField } from '@/components/ui/choice-field'
import { typedText, type FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { MoneyField, NumberField } from '@/components/ui/text-field'
import type { OfferKind } from '@/lib/contracts/fields'
import { planAdminWords as words } from '@/lib/messages/plan-admin'
import { offerWords } from '@/lib/messages/public'

type Props = { offers: readonly OfferKind[]; currency: string; form: FormState }

/** Paid work, yield, and sums that come once. */
export function PlanWork({ offers, currency, form }: Props) {
  const sums: RowColumn[] = [
    { name: 'name', label: words.name },
    { name: 'amount', label: words.amount, kind: 'decimal' },
    { name: 'currency', label: words.currency, preset: currency },
  ]
  return (
    <Sheet title={words.work}>
      <div className="flex flex-col gap-5">
        {offers.map((offer, at) => (
          <OfferWork key={offer} offer={offer} at={at} currency={currency} form={form} />
        ))}
        <div className="flex flex-wrap items-end gap-4">
          <MoneyField
            name="labourPerHourMinor"
            label={words.labourPerHour}
            hint={words.hints.labourPerHour}
            currency={currency}
            form={form}
            optional
          />
          <NumberField
            name="onceMinutes"
            label={words.onceMinutes}
            hint={words.hints.onceMinutes}
            unit={words.minutes}
            form={form}
          />
          <NumberField
            name="yieldPercent"
            label={words.yieldPercent}
            hint={words.hints.yieldPercent}
            unit={words.percent}
            decimal
            form={form}
          />
          <NumberField
            name="confidencePercent"
            label={words.confidencePercent}
            hint={words.hints.confidencePercent}
            unit={words.percent}
            decimal
            form={form}
          />
        </div>
        <RowsField
          name="oneOff"
          legend={words.oneOff}
          hint={words.oneOffHint}
          columns={sums}
          rowLabel={words.row}
          form={form}
          most={20}
        />
        <RowsField
          name="atRisk"
          legend={words.atRisk}
          hint={words.atRiskHint}
          columns={sums}
          rowLabel={words.row}
          form={form}
          spare={1}
          most={10}
        />
      </div>
    </Sheet>
  )
}

type Work = { offer: OfferKind; at: number; currency: string; form: FormState }

function OfferWork({ offer, at, currency, form }: Work) {
  const name = (field: string) => `offers.${at}.${field}`
  return (
    <fieldset className="flex min-w-0 flex-col gap-3 border-t border-rule pt-2">
      <legend className="text-17 font-semibold">{offerWords[offer]}</legend>
      <input type="hidden" name={name('offer')} value={offer} />
      <CheckField name={name('isAssembled')} label={words.isAssembled} form={form} optional />
      <div className="flex flex-wrap items-end gap-4">
        {(['minutesPerUnit', 'minutesPerStart'] as const).map((field) => (
          <NumberField
            key={field}
            name={name(field)}
            label={words[field]}
            hint={words.hints[field]}
            unit={words.minutes}
            form={form}
            defaultValue={typedText(form, name(field)) ?? '0'}
          />
        ))}
        <NumberField
          name={name('packaging')}
          label={words.packaging}
          hint={words.hints.packaging}
          unit={currency}
          decimal
          form={form}
        />
      </div>
    </fieldset>
  )
}
