import { RowsField } from '@/components/forms/rows-field'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { MoneyField, NumberField } from '@/components/ui/text-field'
import { planAdminWords as words } from '@/lib/messages/plan-admin'

const AMOUNTS = [
  ['postageChargedMinor', words.postageCharged],
  ['postagePaidMinor', words.postagePaid],
  ['feeFixedMinor', words.feeFixed],
  ['disputeFixedMinor', words.disputeFixed],
] as const
const SHARES = [
  ['fee', words.fee],
  ['foreignFee', words.foreignFee],
  ['foreignShare', words.foreignShare],
  ['refundShare', words.refundShare],
  ['disputeShare', words.disputeShare],
] as const

/** What buyers pay beside the price, what the provider keeps, and the tax within. */
export function PlanSelling({ currency, form }: { currency: string; form: FormState }) {
  return (
    <Sheet title={words.selling}>
      <div className="flex flex-col gap-5">
        <div className="flex flex-wrap gap-4">
          <NumberField name="unitsPerOrder" label={words.unitsPerOrder} decimal form={form} />
          {AMOUNTS.map(([name, label]) => (
            <MoneyField key={name} name={name} label={label} currency={currency} form={form} optional />
          ))}
          {SHARES.map(([name, label]) => (
            <NumberField
              key={name}
              name={name}
              label={label}
              unit={words.percent}
              decimal
              form={form}
              optional
            />
          ))}
        </div>
        <RowsField
          name="taxes"
          legend={words.taxes}
          hint={words.taxesHint}
          rowLabel={words.row}
          form={form}
          spare={1}
          most={6}
          columns={[
            { name: 'rate', label: words.taxRate, kind: 'decimal', unit: words.percent },
            { name: 'weight', label: words.weight, kind: 'number' },
          ]}
        />
      </div>
    </Sheet>
  )
}
