import { Contents } from '@/components/parcel/contents'
import { DayText } from '@/components/format/day-text'
import { Table } from '@/components/ui/table'
import type { QueueItem } from '@/lib/contracts/packing'
import { countryName } from '@/lib/core/data/country'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

type Props = {
  slug: string
  items: QueueItem[]
  empty: string
  caption?: string
  filter?: React.ReactNode
  firstHref?: string
  nextHref?: string
}

/** Parcels that wait to be packed. */
export function QueueTable({ slug, items, caption = words.table.queue, ...rest }: Props) {
  const href = (row: QueueItem) => paths.packingParcel(slug, row.parcel)
  return (
    <Table<QueueItem>
      caption={caption}
      rows={items}
      rowKey={(row) => row.parcel}
      {...rest}
      columns={[
        { key: 'order', heading: words.order, cell: (row) => <a href={href(row)}>{row.number}</a> },
        { key: 'to', heading: words.to, cell: (row) => `${row.name}, ${countryName(row.country)}` },
        { key: 'contents', heading: words.contents, cell: (row) => <Contents lines={row.lines} /> },
        { key: 'postedBy', heading: words.postedBy, cell: (row) => <DayText day={row.postedBy} /> },
      ]}
      actions={(row) => <a href={href(row)}>{words.pack}</a>}
    />
  )
}
