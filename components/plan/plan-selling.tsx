import { RowsField } from '@/components/forms/rows-field'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { MoneyField, NumberField } from '@/components/ui/text-field'
import { planAdminWords as words } from '@/lib/messages/plan-admin'

const AMOUNTS = [
  ['postageChargedMinor', 'postageCharged'],
  ['postagePaidMinor', 'postagePaid'],
  ['feeFixedMinor', 'feeFixed'],
  ['disputeFixedMinor', 'disputeFixed'],
] as const
const SHARES = ['fee', 'foreignFee', 'foreignShare', 'refundShare', 'disputeShare'] as const

/** What buyers pay beside the price, what the provider keeps, and the tax within. */
export function PlanSelling({ currency, form }: { currency: string; form: FormState }) {
  return (
    <Sheet title={words.selling}>
      <div className="flex flex-col gap-5">
        <div className="flex flex-wrap items-end gap-4">
          <NumberField
            name="unitsPerOrder"
            label={words.unitsPerOrder}
            hint={words.hints.unitsPerOrder}
            decimal
            form={form}
          />
          {AMOUNTS.map(([name, key]) => (
            <MoneyField
              key={name}
              name={name}
              label={words[key]}
              hint={words.hints[key]}
              currency={currency}
              form={form}
              optional
            />
          ))}
          {SHARES.map((name) => (
            <NumberField
              key={name}
              name={name}
              label={words[name]}
              hint={words.hints[name]}
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
