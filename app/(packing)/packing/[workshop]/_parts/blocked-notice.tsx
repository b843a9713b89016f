import { Notice } from '@/components/ui/notice'
import type { ParcelPaper } from '@/lib/contracts/papers'
import { declarationSentence } from '@/lib/messages/declaration'
import { parcelPaperWords as words } from '@/lib/messages/parcel-papers'

/** Parcels that get no label yet, each with what customs still want. */
export function BlockedNotice({ blocked }: { blocked: readonly ParcelPaper[] }) {
  if (blocked.length === 0) return null
  return (
    <div className="print:hidden">
      <Notice kind="stopped" title={words.blockedTitle}>
        <ul>
          {blocked.map(({ parcel, orderNumber, customs }) => (
            <li key={parcel} className="py-1">
              <strong>{words.blocked(orderNumber)}</strong>{' '}
              {customs.problems
                .filter(({ severity }) => severity === 'error')
                .map(declarationSentence)
                .join(' ')}
            </li>
          ))}
        </ul>
      </Notice>
    </div>
  )
}
