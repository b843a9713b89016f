import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { MoneyField, NumberField } from '@/components/ui/text-field'
import { planAdminWords as words } from '@/lib/messages/plan-admin'

/** What the maker expects around the run: money to lay out, later buyers, repairs. */
export function PlanOutlook({ currency, form }: { currency: string; form: FormState }) {
  return (
    <Sheet title={words.outlook}>
      <div className="flex flex-wrap items-end gap-4">
        <MoneyField
          name="canLayOutMinor"
          label={words.canLayOut}
          hint={words.canLayOutHint}
          currency={currency}
          form={form}
          optional
        />
        <NumberField
          name="laterUnits"
          label={words.laterUnits}
          hint={words.laterUnitsHint}
          form={form}
          optional
        />
        <NumberField
          name="failurePercent"
          label={words.failure}
          hint={words.failureHint}
          unit={words.percent}
          decimal
          form={form}
          optional
        />
      </div>
    </Sheet>
  )
}
