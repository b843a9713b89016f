import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import { Table } from '@/components/ui/table'
import { withParams } from '@/components/ui/with-params'
import type { StoppedOrder } from '@/lib/contracts/packing'
import { countryName } from '@/lib/core/data/country'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

/** Paid orders that are not in the queue, and a way to look again at those whose obstacle has gone. */
export function StoppedSheet({ slug, orders }: { slug: string; orders: readonly StoppedOrder[] }) {
  if (orders.length === 0) return null
  return (
    <Sheet title={words.stopped.title} id="stopped">
      <Table
        caption={words.stopped.caption}
        captionHidden
        rows={orders}
        rowKey={(row) => row.order}
        empty={null}
        columns={[
          {
            key: 'order',
            heading: words.order,
            cell: (row) => (
              <a href={withParams(paths.packing(slug), { number: row.number }, {})}>{row.number}</a>
            ),
          },
          { key: 'to', heading: words.to, cell: (row) => countryName(row.country) },
          {
            key: 'why',
            heading: words.stopped.why,
            cell: (row) => <StateMark kind="attention">{words.stopped.reasons[row.reason]}</StateMark>,
          },
        ]}
      />
      <p className="max-w-words py-3 text-15 text-quiet">{words.stopped.hint}</p>
      <DeedForm action={paths.api.packingFill(slug)}>
        <Button kind="secondary">{words.stopped.fill}</Button>
      </DeedForm>
    </Sheet>
  )
}
