import { DayText } from '@/components/format/day-text'
import { Percent } from '@/components/format/percent'
import { StateMark } from '@/components/ui/state-mark'
import { Table } from '@/components/ui/table'
import type { ScheduleDesk } from '@/lib/contracts/schedule'
import { offerWords } from '@/lib/messages/public'
import { scheduleWords as words } from '@/lib/messages/schedule'

/** What each offer is promised for, how likely that is, and the day that is kept in eight cases of ten. */
export function OfferDatesTable({ desk: { offers, isExact, start } }: { desk: ScheduleDesk }) {
  return (
    <div>
      <Table
        caption={words.promises}
        rows={offers}
        rowKey={({ offer }) => offer}
        empty={words.noSteps}
        columns={[
          { key: 'offer', heading: words.offer, cell: ({ offer }) => offerWords[offer] },
          { key: 'postedBy', heading: words.postedBy, cell: ({ postedBy }) => <DayText day={postedBy} /> },
          {
            key: 'chance',
            heading: words.chance,
            kind: 'figures',
            cell: ({ chance }) => <Percent ratio={chance} />,
          },
          {
            key: 'suggested',
            heading: words.suggested,
            cell: ({ suggested, postedBy }) => (
              <>
                <DayText day={suggested} />{' '}
                <StateMark kind={suggested <= postedBy ? 'done' : 'attention'}>
                  {suggested <= postedBy ? words.sound : words.tooEarly}
                </StateMark>
              </>
            ),
          },
        ]}
      />
      <p className="max-w-words pt-2 text-13 text-quiet">
        {words.counted(start)} {isExact ? '' : words.bounds}
      </p>
    </div>
  )
}
