import { DayText } from '@/components/format/day-text'
import { CodeBars } from '@/components/parcel/code-bars'
import { Empty } from '@/components/ui/empty'
import { TitleBlock } from '@/components/ui/title-block'
import type { FulfilmentOrder } from '@/lib/contracts/papers'
import { packingWords } from '@/lib/messages/packing'
import { papers } from '@/lib/messages/papers'
import { code128 } from '@/lib/papers/code-128'
import { groupByContents, type ToPick, toPick } from '@/lib/papers/group-by-contents'
import type { FulfilmentPaper } from '@/lib/queries/packing/get-fulfilment-orders'

const words = papers.list
const nameOf = ({ module, offer, choices }: ToPick) =>
  [`${module}, ${papers.offers[offer]}`, ...choices].join('; ')

/** The fulfilment list as it prints: what to take from the shelf, then each order, same contents together. */
export function ListSheet({ paper }: { paper: FulfilmentPaper }) {
  const { orders, runs, workshop, printedBy, printedOn } = paper
  if (orders.length === 0) return <Empty>{words.nothing}</Empty>
  const title = packingWords.listName(runs)
  const units = toPick(orders).reduce((sum, { quantity }) => sum + quantity, 0)
  return (
    <section aria-label={words.name}>
      <h2 className="text-28">{words.name}</h2>
      <p className="text-17">{title}</p>
      <p className="pb-4 text-15 text-quiet">{words.summary(orders.length, units)}</p>
      <h3 className="text-21">{words.pick}</h3>
      <ul className="mb-6 border-t border-ink">
        {toPick(orders).map((pick) => (
          <li key={nameOf(pick)} className="flex gap-3 border-b border-rule py-1.5">
            <TickBox />
            <span className="figures w-14 text-right font-semibold">{pick.quantity} ×</span>
            <span>
              {pick.place ? <span className="figures">{words.place(pick.place)} </span> : null}
              {nameOf(pick)}
            </span>
          </li>
        ))}
      </ul>
      {groupByContents(orders).map((group) => (
        <div key={group.orders[0]?.number} className="pb-6">
          <h3 className="border-t-2 border-ink pt-1 text-17">
            {group.lines.map((line) => `${line.quantity} × ${nameOf(line)}`).join(' + ')}
          </h3>
          <p className="text-13 text-quiet">{words.same(group.orders.length)}</p>
          <ul>
            {group.orders.map((order, index) => (
              <Row key={`${order.number}-${index}`} order={order} />
            ))}
          </ul>
        </div>
      ))}
      <TitleBlock
        what={`${words.name}: ${title}`}
        who={`${workshop}, ${printedBy}`}
        when={<DayText day={printedOn} />}
      />
    </section>
  )
}

function Row({ order }: { order: FulfilmentOrder }) {
  return (
    <li className="keep-together flex flex-wrap items-center gap-x-6 gap-y-1 border-b border-rule py-2">
      <TickBox />
      <CodeBars widths={code128(order.number)} text={order.number} />
      <span className="grow">
        {order.name}, {order.country}
      </span>
      <DayText day={order.postedBy} />
    </li>
  )
}

/** A box for a pencil. */
function TickBox() {
  return <span aria-hidden="true" className="mt-1 inline-block size-4 shrink-0 border border-ink" />
}
