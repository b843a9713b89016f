import { Table } from '@/components/ui/table'
import type { BulkView } from '@/lib/contracts/run-page'
import { reasonWords } from '@/lib/messages/reasons'
import { runWords as words } from '@/lib/messages/runs'

/** Why some of the rows did not succeed, counted; nothing where all did. */
export function FailureTable({ failures }: { failures: BulkView['failures'] }) {
  if (failures.length === 0) return null
  return (
    <Table
      caption={words.bulkNotDone}
      rows={failures}
      rowKey={(row) => row.reason}
      empty=""
      columns={[
        {
          key: 'why',
          heading: words.bulkWhy,
          cell: (row) => words.bulkReasons[row.reason] ?? reasonWords(row.reason),
        },
        { key: 'count', heading: words.bulkCount, kind: 'figures', cell: (row) => row.count },
      ]}
    />
  )
}
