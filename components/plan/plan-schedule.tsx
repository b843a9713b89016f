import { RowsField, type RowColumn } from '@/components/forms/rows-field'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { planAdminWords as words } from '@/lib/messages/plan-admin'

/** The steps from the lock to the last parcel, each with three estimates. */
export function PlanSchedule({ form }: { form: FormState }) {
  return (
    <Sheet title={words.schedule} id="schedule">
      <RowsField
        name="steps"
        legend={words.steps}
        hint={words.scheduleHint}
        rowLabel={words.stepRow}
        form={form}
        spare={2}
        most={30}
        columns={[
          { name: 'name', label: words.step },
          { name: 'optimistic', label: words.optimistic, kind: 'number', unit: words.days },
          { name: 'likely', label: words.likely, kind: 'number', unit: words.days },
          { name: 'pessimistic', label: words.pessimistic, kind: 'number', unit: words.days },
          { name: 'after', label: words.after },
          ...(['boards', 'kit', 'built'] as const).map((offer): RowColumn => ({
            name: offer,
            label: words.stepFor[offer],
            kind: 'tick',
          })),
          { name: 'closedFrom', label: words.closedFrom, kind: 'date' },
          { name: 'closedTo', label: words.closedTo, kind: 'date' },
        ]}
      />
    </Sheet>
  )
}
