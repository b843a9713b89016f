import { DayText } from '@/components/format/day-text'
import { StateMark } from '@/components/ui/state-mark'
import { Table } from '@/components/ui/table'
import type { ProblemView } from '@/lib/contracts/problems'
import { problemWords as words } from '@/lib/messages/problems'
import { paths } from '@/lib/paths'

const MARKS = { open: 'attention', answered: 'done', closed: 'done' } as const

/** Reports with what was answered, unanswered ones first. */
export function ProblemTable({ slug, problems }: { slug: string; problems: ProblemView[] }) {
  const href = (row: ProblemView) => `${paths.adminProblems(slug)}?problem=${row.problem}#answer`
  return (
    <Table<ProblemView>
      caption={words.caption}
      rows={problems}
      rowKey={(row) => row.problem}
      empty={words.empty}
      columns={[
        { key: 'number', heading: words.number, cell: (row) => row.number },
        { key: 'order', heading: words.order, cell: (row) => row.orderNumber },
        {
          key: 'what',
          heading: words.what,
          cell: (row) => (
            <>
              {words.kinds[row.kind]}
              <span className="block text-15 text-quiet">{row.story}</span>
            </>
          ),
        },
        {
          key: 'state',
          heading: words.state,
          cell: (row) => (
            <>
              <StateMark kind={MARKS[row.state]}>{words.states[row.state]}</StateMark>
              {row.remedy ? <span className="block text-15">{words.remedies[row.remedy]}</span> : null}
            </>
          ),
        },
        { key: 'by', heading: words.by, cell: (row) => <DayText day={row.answerBy} /> },
      ]}
      actions={(row) => (row.state === 'open' ? <a href={href(row)}>{words.answer}</a> : null)}
    />
  )
}
