import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { DemandBoard } from '@/lib/contracts/demand'
import { demandWords as words } from '@/lib/messages/demand'
import { writtenNumber } from '@/lib/messages/written'

/** What those under deposit chose, question by question. */
export function ChoicesSheet({ board }: { board: DemandBoard }) {
  if (board.byChoice.length === 0) return null
  return (
    <Sheet title={words.byChoice}>
      <Table
        caption={words.byChoice}
        captionHidden
        narrow="scroll"
        rows={board.byChoice}
        rowKey={({ question, answer }) => `${question} ${answer}`}
        empty={words.none}
        columns={[
          { key: 'answer', heading: words.answer, cell: (row) => `${row.question}: ${row.answer}` },
          { key: 'units', heading: words.units, kind: 'figures', cell: (row) => writtenNumber(row.units) },
        ]}
      />
    </Sheet>
  )
}
