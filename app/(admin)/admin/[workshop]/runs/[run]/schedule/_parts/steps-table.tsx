import { DayText } from '@/components/format/day-text'
import { Table } from '@/components/ui/table'
import type { ScheduleDesk } from '@/lib/contracts/schedule'
import { offerWords } from '@/lib/messages/public'
import { scheduleWords as words } from '@/lib/messages/schedule'

/** The steps with their estimates, their dates and how often each decides the finish. */
export function StepsTable({ desk: { steps, offers } }: { desk: ScheduleDesk }) {
  return (
    <Table
      caption={words.steps}
      rows={steps}
      rowKey={({ id }) => id}
      empty={words.noSteps}
      columns={[
        { key: 'name', heading: words.step, cell: ({ name }) => name },
        {
          key: 'estimates',
          heading: words.estimates,
          kind: 'figures',
          cell: ({ optimistic, likely, pessimistic }) => `${optimistic} / ${likely} / ${pessimistic}`,
        },
        { key: 'after', heading: words.after, cell: ({ after }) => after.join(', ') || words.start },
        {
          key: 'for',
          heading: words.for,
          cell: ({ offers: own }) =>
            own.length === offers.length ? words.all : own.map((offer) => offerWords[offer]).join(', '),
        },
        { key: 'from', heading: words.from, cell: ({ from }) => <DayText day={from} /> },
        {
          key: 'to',
          heading: words.to,
          cell: ({ to, longer }) => (
            <>
              <DayText day={to} />
              {longer > 0 ? <span className="block text-15 text-quiet">{words.longer(longer)}</span> : null}
            </>
          ),
        },
        {
          key: 'decides',
          heading: words.decides,
          kind: 'figures',
          cell: ({ decides: { low, high } }) => words.share(low, high),
        },
      ]}
    />
  )
}
