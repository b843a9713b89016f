import { Button } from '@/components/ui/button'
import { NumberField } from '@/components/ui/text-field'
import { costWords as words } from '@/lib/messages/costs'

/** For how many units the sheets stand; a question, so it is sent by GET. */
export function UnitsForm({ action, units }: { action: string; units: number | undefined }) {
  return (
    <form action={action} method="get" className="flex flex-wrap items-end gap-4 print:hidden">
      <NumberField
        name="units"
        label={words.units}
        hint={words.unitsHint}
        defaultValue={units === undefined ? '' : String(units)}
        optional
      />
      <Button kind="secondary">{words.show}</Button>
    </form>
  )
}
