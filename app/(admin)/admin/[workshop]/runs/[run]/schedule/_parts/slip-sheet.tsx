import { DayText } from '@/components/format/day-text'
import { Percent } from '@/components/format/percent'
import { Button } from '@/components/ui/button'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import { NumberField } from '@/components/ui/text-field'
import type { ScheduleDesk } from '@/lib/contracts/schedule'
import { offerWords } from '@/lib/messages/public'
import { scheduleWords as words } from '@/lib/messages/schedule'

type Props = { desk: ScheduleDesk; here: string; step: string | undefined; days: number | undefined }

/** What one late step does to every date. A question, so it is sent by GET. */
export function SlipSheet({ desk, here, step, days }: Props) {
  const { steps, offers, slipped } = desk
  const before = (offer: string) => offers.find((each) => each.offer === offer)
  return (
    <Sheet title={words.slip} id="slip">
      <form action={`${here}#slip`} method="get" className="flex flex-wrap items-end gap-4 pb-4 print:hidden">
        <SelectField
          name="step"
          label={words.slipStep}
          options={steps.map(({ id, name }) => ({ value: id, label: name }))}
          empty={false}
          defaultValue={step ?? steps[0]?.id}
          width="short"
        />
        <NumberField
          name="days"
          label={words.slipDays}
          unit={words.days}
          defaultValue={days === undefined ? '5' : String(days)}
        />
        <Button kind="secondary">{words.slipShow}</Button>
      </form>
      {slipped ? (
        <Table
          caption={words.slipCaption(slipped.name, slipped.days)}
          rows={slipped.offers}
          rowKey={({ offer }) => offer}
          empty={words.noSteps}
          columns={[
            { key: 'offer', heading: words.offer, cell: ({ offer }) => offerWords[offer] },
            { key: 'postedBy', heading: words.postedBy, cell: ({ postedBy }) => <DayText day={postedBy} /> },
            {
              key: 'chance',
              heading: words.chanceThen,
              kind: 'figures',
              cell: ({ offer, chance }) => (
                <>
                  <Percent ratio={before(offer)?.chance ?? 0} /> → <Percent ratio={chance} />
                </>
              ),
            },
            {
              key: 'suggested',
              heading: words.suggestedThen,
              cell: ({ offer, suggested }) => (
                <>
                  <DayText day={before(offer)?.suggested ?? suggested} /> → <DayText day={suggested} />
                </>
              ),
            },
          ]}
        />
      ) : (
        <p className="text-quiet">{words.slipLead}</p>
      )}
    </Sheet>
  )
}
