import { StateMark } from '@/components/ui/state-mark'
import { Table } from '@/components/ui/table'
import type { UnitRow } from '@/lib/contracts/units'
import { papers } from '@/lib/messages/papers'
import { unitWords as words } from '@/lib/messages/units'

const MARKS = {
  started: 'open',
  rework: 'attention',
  passed: 'open',
  allocated: 'attention',
  posted: 'done',
  returned: 'stopped',
  scrapped: 'stopped',
} as const

/** Every unit of a run and where it is. */
export function UnitTable({ units, csvHref }: { units: UnitRow[]; csvHref: string }) {
  return (
    <Table<UnitRow>
      caption={words.caption}
      rows={units}
      rowKey={(row) => row.unit}
      empty={words.empty}
      csvHref={csvHref}
      columns={[
        {
          key: 'serial',
          heading: words.serial,
          cell: (row) => <span className="figures">{row.serial}</span>,
        },
        { key: 'offer', heading: words.offer, cell: (row) => papers.offers[row.offer] },
        {
          key: 'state',
          heading: words.state,
          cell: (row) => <StateMark kind={MARKS[row.state]}>{words.states[row.state]}</StateMark>,
        },
        { key: 'order', heading: words.order, cell: (row) => row.orderNumber ?? '–' },
      ]}
    />
  )
}
