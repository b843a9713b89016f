import { When } from '@/components/format/when'
import { Notice } from '@/components/ui/notice'
import type { OrderFormView } from '@/lib/contracts/order-quote'
import { orderFormWords as words } from '@/lib/messages/orders'

/** Why nothing can be ordered at the moment, and when that changes. */
export function ClosedNotice({ run }: { run: OrderFormView }) {
  const opens = run.closedBecause === 'not_open_to_all_yet' ? run.opensToAllAt : null
  return (
    <Notice title={words.closedTitle}>
      {run.closedBecause ? <p>{words.closed[run.closedBecause]}</p> : null}
      {opens === null ? null : (
        <p>
          {words.opensAt} <When at={opens} zone={run.timeZone} />.
        </p>
      )}
    </Notice>
  )
}
