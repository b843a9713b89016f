import { DayText } from '@/components/format/day-text'
import { Button } from '@/components/ui/button'
import { Empty } from '@/components/ui/empty'
import { DeedForm } from '@/components/ui/form'
import { StateMark } from '@/components/ui/state-mark'
import { Table } from '@/components/ui/table'
import type { HostWorkshop } from '@/lib/contracts/workshops'
import { countryName } from '@/lib/core/data/country'
import { workshopWords as words } from '@/lib/messages/workshops'
import { paths } from '@/lib/paths'

const MOVES = { pending: ['open'], open: ['suspend'], suspended: ['reopen'] } as const
const MARKS = { pending: 'open', open: 'done', suspended: 'stopped' } as const

/** Who trades here, where each stands, and the one thing the host may do about it. */
export function WorkshopTable({ rows }: { rows: HostWorkshop[] }) {
  return (
    <Table
      caption={words.hostTable}
      rows={rows}
      rowKey={(row) => row.slug}
      empty={<Empty>{words.none}</Empty>}
      columns={[
        {
          key: 'name',
          heading: words.name,
          cell: (row) => <a href={paths.workshop(row.slug)}>{row.name}</a>,
        },
        {
          key: 'trader',
          heading: words.trader,
          cell: (row) =>
            `${row.legalName ?? '–'}, ${countryName(row.country)}${row.replyTo ? `, ${row.replyTo}` : ''}`,
        },
        {
          key: 'state',
          heading: words.state,
          cell: (row) => <StateMark kind={MARKS[row.state]}>{words.states[row.state]}</StateMark>,
        },
        {
          key: 'card',
          heading: words.card,
          cell: (row) => (row.chargesEnabled ? words.cardReady : words.cardMissing),
        },
        { key: 'since', heading: words.since, cell: (row) => <DayText day={row.createdAt.slice(0, 10)} /> },
        { key: 'runs', heading: words.runs, kind: 'figures', cell: (row) => row.runs },
        { key: 'units', heading: words.units, kind: 'figures', cell: (row) => row.units },
      ]}
      actions={(row) =>
        MOVES[row.state].map((move) => (
          <DeedForm key={move} action={paths.api.hostWorkshop(row.slug, move)}>
            <Button kind={move === 'suspend' ? 'destructive' : 'secondary'}>{words[move]}</Button>
          </DeedForm>
        ))
      }
    />
  )
}
