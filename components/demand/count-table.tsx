import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { DemandCount } from '@/lib/contracts/demand'
import { demandWords as words } from '@/lib/messages/demand'
import { writtenNumber } from '@/lib/messages/written'

type Props = {
  title: string
  rows: readonly DemandCount[]
  nameOf: (key: string) => string
  csvHref: string
}

/** People and units by one answer. */
export function CountTable({ title, rows, nameOf, csvHref }: Props) {
  return (
    <Sheet title={title}>
      <Table
        caption={title}
        captionHidden
        narrow="scroll"
        rows={rows}
        rowKey={({ key }) => key}
        empty={words.none}
        csvHref={csvHref}
        columns={[
          { key: 'answer', heading: words.answer, cell: ({ key }) => nameOf(key) },
          {
            key: 'people',
            heading: words.people,
            kind: 'figures',
            cell: ({ people }) => writtenNumber(people),
          },
          { key: 'units', heading: words.units, kind: 'figures', cell: ({ units }) => writtenNumber(units) },
        ]}
      />
    </Sheet>
  )
}
