import { Button } from '@/components/ui/button'
import { DayText } from '@/components/format/day-text'
import { DeedForm } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import type { ParcelPage } from '@/lib/contracts/packing'
import type { Reported } from '@/lib/contracts/tracking'
import { postWords } from '@/lib/messages/post'
import { paths } from '@/lib/paths'

const words = postWords.report

/** What can be said of a parcel where it stands now. */
const SAYS: Partial<Record<ParcelPage['state'], Reported[]>> = {
  handed_over: ['delivered', 'lost', 'returned'],
  lost: ['found'],
  delivered: ['returned'],
}

/** Notes by hand what became of a parcel. */
export function ReportForm({ slug, parcel }: { slug: string; parcel: ParcelPage }) {
  const says = SAYS[parcel.state] ?? []
  if (says.length === 0) return null
  return (
    <Sheet title={words.title} id="report">
      <div className="flex flex-wrap gap-3">
        {says.map((state) => (
          <DeedForm
            key={state}
            action={paths.api.packingParcel(slug, parcel.parcel, 'report')}
            hidden={{ state }}
          >
            <Button kind="secondary">{words[state]}</Button>
          </DeedForm>
        ))}
      </div>
      {parcel.claimByOn === null ? null : (
        <p className="pt-3 text-15 text-quiet">
          {words.claimBy} <DayText day={parcel.claimByOn} />
        </p>
      )}
    </Sheet>
  )
}
