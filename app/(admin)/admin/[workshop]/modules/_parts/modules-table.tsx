import { StateMark } from '@/components/ui/state-mark'
import { Table } from '@/components/ui/table'
import type { ModuleListItem } from '@/lib/contracts/module-desk'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

const MARKS = { draft: 'open', published: 'done', archived: 'stopped' } as const

/** A workshop's modules, how they are sold and how much interest there is. */
export function ModulesTable({ slug, rows }: { slug: string; rows: ModuleListItem[] }) {
  return (
    <Table
      caption={words.table}
      rows={rows}
      rowKey={(row) => row.slug}
      empty={words.none}
      columns={[
        {
          key: 'name',
          heading: words.name,
          cell: (row) => <a href={paths.adminModule(slug, row.slug)}>{row.name}</a>,
        },
        { key: 'oneLine', heading: words.oneLine, cell: (row) => row.oneLine },
        {
          key: 'state',
          heading: words.state,
          cell: (row) => <StateMark kind={MARKS[row.state]}>{words.states[row.state]}</StateMark>,
        },
        {
          key: 'offers',
          heading: words.offers,
          cell: (row) => row.offers.map((offer) => offerWords[offer]).join(', ') || words.notSet,
        },
        {
          key: 'interest',
          heading: words.interest,
          kind: 'figures',
          cell: (row) => words.unitsAsked(row.signUps, row.units),
        },
        { key: 'runs', heading: words.runs, kind: 'figures', cell: (row) => row.runs },
      ]}
    />
  )
}
