import { Contents } from '@/components/parcel/contents'
import { DayText } from '@/components/format/day-text'
import { Stack } from '@/components/ui/columns'
import { Table } from '@/components/ui/table'
import { withParams } from '@/components/ui/with-params'
import type { QueueQuery } from '@/lib/contracts/packing'
import { countryName } from '@/lib/core/data/country'
import type { Actor } from '@/lib/core/policy/can'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { listStoppedOrders } from '@/lib/queries/packing/list-stopped-orders'
import { QueueFilter } from './queue-filter'
import { StoppedSheet } from './stopped-sheet'

type Props = { actor: Actor; workshopId: string; slug: string; query: QueueQuery; countries: string[] }

/** What can be packed now, and what cannot with the reason. */
export async function QueueSheet({ actor, workshopId, slug, query, countries }: Props) {
  const { items, next } = await listPackQueue({ actor, workshopId, query })
  const stopped = await listStoppedOrders({ actor, workshopId })
  const isFiltered = Boolean(query.offer ?? query.country)
  const here = (changes: Record<string, string | null>) => withParams(paths.packing(slug), query, changes)
  return (
    <Stack>
      <Table
        caption={words.table.queue}
        rows={items}
        rowKey={(row) => row.parcel}
        filter={<QueueFilter slug={slug} query={query} countries={countries} />}
        empty={isFiltered ? words.empty.filtered : words.empty.queue}
        firstHref={query.after ? here({ after: null }) : undefined}
        nextHref={next ? here({ after: next }) : undefined}
        columns={[
          {
            key: 'order',
            heading: words.order,
            cell: (row) => <a href={paths.packingParcel(slug, row.parcel)}>{row.number}</a>,
          },
          { key: 'to', heading: words.to, cell: (row) => `${row.name}, ${countryName(row.country)}` },
          { key: 'contents', heading: words.contents, cell: (row) => <Contents lines={row.lines} /> },
          { key: 'postedBy', heading: words.postedBy, cell: (row) => <DayText day={row.postedBy} /> },
        ]}
        actions={(row) => <a href={paths.packingParcel(slug, row.parcel)}>{words.pack}</a>}
      />
      <StoppedSheet slug={slug} orders={stopped} />
    </Stack>
  )
}
