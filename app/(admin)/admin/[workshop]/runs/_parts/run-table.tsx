import { DayText } from '@/components/format/day-text'
import { RunStateMark } from '@/components/run/run-state'
import { LinkButton } from '@/components/ui/button'
import { Empty } from '@/components/ui/empty'
import { Table } from '@/components/ui/table'
import type { RunListItem } from '@/lib/contracts/runs'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'

type Props = { workshop: string; items: RunListItem[]; next: string | null; isFirst: boolean }

/** A workshop's runs, each leading to its page. */
export function RunTable({ workshop, items, next, isFirst }: Props) {
  const start = <LinkButton href={paths.adminRunNew(workshop)}>{words.newTitle}</LinkButton>
  return (
    <Table
      caption={words.listCaption}
      rows={items}
      rowKey={(row) => row.id}
      empty={<Empty action={start}>{words.none}</Empty>}
      firstHref={isFirst ? undefined : paths.adminRuns(workshop)}
      nextHref={next === null ? undefined : `${paths.adminRuns(workshop)}?after=${next}`}
      columns={[
        {
          key: 'module',
          heading: words.module,
          cell: (row) => (
            <a href={paths.adminRun(workshop, row.id)}>{words.runTitle(row.module.name, row.number)}</a>
          ),
        },
        { key: 'revision', heading: words.revision, cell: (row) => row.revision },
        { key: 'state', heading: words.state, cell: (row) => <RunStateMark state={row.state} /> },
        { key: 'deposited', heading: words.deposited, kind: 'figures', cell: (row) => row.deposited },
        { key: 'minimum', heading: words.minimum, kind: 'figures', cell: (row) => row.minimum },
        { key: 'maximum', heading: words.maximum, kind: 'figures', cell: (row) => row.maximum },
        { key: 'decideBy', heading: words.decideBy, cell: (row) => <DayText day={row.decideBy} /> },
      ]}
    />
  )
}
