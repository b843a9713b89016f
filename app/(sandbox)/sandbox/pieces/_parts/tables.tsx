import { Money } from '@/components/format/money'
import { Weight } from '@/components/format/weight'
import { Empty } from '@/components/ui/empty'
import { LinkButton } from '@/components/ui/button'
import { Loading } from '@/components/ui/loading'
import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import { Table, type Column } from '@/components/ui/table'

type Row = { number: string; who: string; minor: number; grams: number; state: 'done' | 'attention' }

const rows: Row[] = [
  { number: 'HP-0041', who: 'Ireland', minor: 18900, grams: 640, state: 'done' },
  {
    number: 'HP-0042',
    who: 'Łódź, Poland, a place with a rather long name',
    minor: 1234500,
    grams: 1250,
    state: 'attention',
  },
  { number: 'HP-0043', who: '日本', minor: 900, grams: 85, state: 'done' },
]

const columns: Column<Row>[] = [
  {
    key: 'number',
    heading: 'Number',
    cell: (row) => <span className="figures">{row.number}</span>,
    sort: { href: '#tables', direction: 'ascending' },
  },
  { key: 'who', heading: 'To', cell: (row) => row.who, sort: { href: '#tables' } },
  {
    key: 'state',
    heading: 'State',
    cell: (row) => (
      <StateMark kind={row.state}>{row.state === 'done' ? 'Paid' : 'Needs the card holder'}</StateMark>
    ),
  },
  { key: 'grams', heading: 'Weight', kind: 'figures', cell: (row) => <Weight grams={row.grams} /> },
  {
    key: 'minor',
    heading: 'Sum',
    kind: 'figures',
    cell: (row) => <Money minor={row.minor} currency="EUR" />,
    sort: { href: '#tables', direction: 'descending' },
  },
]

export function Tables() {
  return (
    <Sheet id="tables" title="Tables">
      <div className="flex flex-col gap-8">
        <Table
          caption="Orders of this run, oldest first"
          columns={columns}
          rows={rows}
          rowKey={(row) => row.number}
          actions={(row) => (
            <>
              <a href={`#${row.number}`}>Open</a>
              <a href={`#pack-${row.number}`}>Pack</a>
            </>
          )}
          empty="None."
          csvHref="#csv"
          firstHref="#first"
          nextHref="#next"
        />
        <Table
          caption="The same, kept as a table where it is narrow"
          columns={columns}
          rows={rows}
          rowKey={(row) => row.number}
          empty="None."
          narrow="scroll"
        />
        <Table
          caption="Nothing yet"
          columns={columns}
          rows={[]}
          rowKey={(row) => row.number}
          empty="No orders yet. They appear here as soon as the first deposit has been paid."
        />
        <Empty action={<LinkButton href="#tables">Start a run</LinkButton>}>
          There is no run yet. A run takes deposits until its minimum is reached.
        </Empty>
        <Loading what="Reading the orders" />
      </div>
    </Sheet>
  )
}
