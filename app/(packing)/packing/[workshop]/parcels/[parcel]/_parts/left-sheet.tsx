import { When } from '@/components/format/when'
import { Weight } from '@/components/format/weight'
import { lineName } from '@/components/parcel/line-names'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import type { ParcelPage } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'

/** What is in a parcel that is not being packed now, and what is known of its way. */
export function LeftSheet({ parcel }: { parcel: ParcelPage }) {
  const { lines, grams, sizeMm, service, tracking, trackingKind, handedOverAt, timeZone } = parcel
  const facts = [
    grams === null ? null : { name: words.weight, value: <Weight grams={grams} /> },
    sizeMm === null ? null : { name: words.size, value: `${sizeMm.join(' × ')} mm` },
    service === null ? null : { name: words.service, value: service },
    tracking === null || trackingKind === null
      ? null
      : { name: words.tracking, value: `${tracking} (${words.trackingKind[trackingKind]})` },
    handedOverAt === null ? null : { name: words.when, value: <When at={handedOverAt} zone={timeZone} /> },
  ].filter((fact) => fact !== null)
  return (
    <Sheet title={words.lines} id="contents">
      <ul className="pb-3">
        {lines.map((line) => (
          <li key={line.line} className="text-17">
            {lineName(line)}
            {line.serials.length > 0 ? (
              <span className="block text-15 text-quiet">
                {words.serials}: <span className="figures">{line.serials.join(', ')}</span>
              </span>
            ) : null}
          </li>
        ))}
      </ul>
      {facts.length > 0 ? <Facts facts={facts} /> : null}
    </Sheet>
  )
}
