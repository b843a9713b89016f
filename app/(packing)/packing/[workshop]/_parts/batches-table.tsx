import { Table } from '@/components/ui/table'
import type { BatchRow } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

/** Batches with their packers, those under way first; nothing before the first was taken. */
export function BatchesTable({ slug, batches }: { slug: string; batches: BatchRow[] }) {
  if (batches.length === 0) return null
  return (
    <Table<BatchRow>
      caption={words.batches.caption}
      rows={batches}
      rowKey={(row) => row.batch}
      empty=""
      columns={[
        {
          key: 'name',
          heading: words.batches.name,
          cell: (row) => <a href={paths.packingBatch(slug, row.batch)}>{row.name}</a>,
        },
        { key: 'packer', heading: words.batches.packer, cell: (row) => row.packer },
        {
          key: 'progress',
          heading: words.batches.progress,
          cell: (row) => words.batches.of(row.packed, row.posted, row.total),
        },
      ]}
      actions={(row) => <a href={paths.packingBatch(slug, row.batch)}>{words.batches.open}</a>}
    />
  )
}
