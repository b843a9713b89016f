import { DayText } from '@/components/format/day-text'
import { Table } from '@/components/ui/table'
import type { PartsDesk } from '@/lib/contracts/module-desk'
import { partsAdminWords as words } from '@/lib/messages/parts-admin'

const day = (on: string | null) => (on === null ? words.missing : <DayText day={on} />)

/** The lines of a parts list with what the readiness list asks of them. */
export function PartsTable({ parts }: { parts: PartsDesk }) {
  return (
    <Table
      caption={`${words.table}, ${words.revision.toLowerCase()} ${parts.revision}`}
      rows={parts.lines}
      rowKey={(row) => row.id}
      empty={words.none}
      columns={[
        { key: 'code', heading: words.code, cell: (row) => row.code },
        { key: 'value', heading: words.value, cell: (row) => row.value },
        { key: 'designators', heading: words.designators, cell: (row) => row.designators },
        { key: 'perUnit', heading: words.perUnit, kind: 'figures', cell: (row) => row.perUnit },
        {
          key: 'placed',
          heading: words.placedBy,
          cell: (row) =>
            Object.entries(row.placedBy)
              .map(([offer, who]) => `${offer}: ${who}`)
              .join(', '),
        },
        { key: 'quoted', heading: words.quotedOn, cell: (row) => day(row.quotedOn) },
        { key: 'stock', heading: words.stockSeenOn, cell: (row) => day(row.stockSeenOn) },
        { key: 'sample', heading: words.sample, cell: (row) => words.samples[row.sample] },
      ]}
    />
  )
}
