import { DayText } from '@/components/format/day-text'
import { LinkButton } from '@/components/ui/button'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { Desk } from '@/lib/contracts/workshops'
import { deskWords as words } from '@/lib/messages/desk'
import { paths } from '@/lib/paths'

/** The runs that are going, soonest decision first. */
export function RunsSheet({ slug, runs }: { slug: string; runs: Desk['runs'] }) {
  return (
    <Sheet title={words.runsTitle} id="runs">
      <Table
        caption={words.runsTitle}
        captionHidden
        rows={runs}
        rowKey={(row) => row.id}
        empty={
          <div className="flex flex-col items-start gap-3">
            <p>{words.noRuns}</p>
            <LinkButton href={paths.adminRunNew(slug)}>{words.newRun}</LinkButton>
          </div>
        }
        columns={[
          {
            key: 'run',
            heading: words.run,
            cell: (row) => <a href={paths.adminRun(slug, row.id)}>{row.module}</a>,
          },
          { key: 'state', heading: words.state, cell: (row) => words.runStates[row.state] },
          {
            key: 'places',
            heading: words.places,
            kind: 'figures',
            cell: (row) => words.placesOf(row.committed, row.minimum, row.maximum),
          },
          { key: 'decideBy', heading: words.decideBy, cell: (row) => <DayText day={row.decideBy} /> },
        ]}
      />
    </Sheet>
  )
}
