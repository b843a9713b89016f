import { DayText } from '@/components/format/day-text'
import { When } from '@/components/format/when'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { RunOutcome } from '@/lib/contracts/run-outcome'
import { outcomeWords as words } from '@/lib/messages/outcome'
import { writtenNumber, writtenPercent } from '@/lib/messages/written'

type Props = { outcome: RunOutcome }

/** What was forecast at each quarter of the window, and whether it held. */
export function ForecastsSheet({ outcome }: Props) {
  const { forecasts, decidedUnits, run, workshop } = outcome
  return (
    <Sheet title={words.forecasts} id="forecasts">
      <p className="max-w-words pb-3">
        {decidedUnits === null ? words.undecided : words.decidedWith(decidedUnits, run.minimum)}
      </p>
      <Table
        caption={words.forecasts}
        captionHidden
        rows={forecasts}
        rowKey={({ quarter }) => String(quarter)}
        empty={words.noForecasts}
        columns={[
          { key: 'quarter', heading: words.quarter, cell: ({ quarter }) => words.quarterOf(quarter) },
          { key: 'at', heading: words.when, cell: ({ at }) => <When at={at} zone={workshop.timeZone} /> },
          {
            key: 'deposited',
            heading: words.deposited,
            kind: 'figures',
            cell: ({ deposited }) => writtenNumber(deposited),
          },
          { key: 'mean', heading: words.expected, kind: 'figures', cell: ({ mean }) => words.tenth(mean) },
          {
            key: 'range',
            heading: words.range,
            kind: 'figures',
            cell: ({ low, high }) => words.rangeOf(low, high),
          },
          {
            key: 'chance',
            heading: words.chance,
            kind: 'figures',
            cell: ({ chance }) => writtenPercent(chance),
          },
          { key: 'held', heading: words.held, cell: ({ held }) => words.heldOf(held) },
        ]}
      />
    </Sheet>
  )
}

/** Each offer's first promise beside the day its last unit went out. */
export function DatesSheet({ outcome }: Props) {
  return (
    <Sheet title={words.dates} id="dates">
      <Table
        caption={words.dates}
        captionHidden
        rows={outcome.dates}
        rowKey={({ offer }) => offer}
        empty={words.notPosted}
        columns={[
          { key: 'offer', heading: words.offer, cell: ({ offer }) => words.offers[offer] ?? offer },
          {
            key: 'promised',
            heading: words.promisedBy,
            cell: ({ promisedBy }) => <DayText day={promisedBy} />,
          },
          {
            key: 'posted',
            heading: words.postedOn,
            cell: ({ postedOn }) => (postedOn === null ? words.notPosted : <DayText day={postedOn} />),
          },
          { key: 'late', heading: words.difference, cell: ({ daysLate }) => words.daysLate(daysLate) },
        ]}
      />
    </Sheet>
  )
}

/** What this run has taught about each class of people. */
export function LearnedSheet({ outcome }: Props) {
  return (
    <Sheet title={words.learned} id="learned">
      <Table
        caption={words.learned}
        captionHidden
        rows={outcome.learned}
        rowKey={({ name }) => name}
        empty={words.learnedNone}
        columns={[
          { key: 'class', heading: words.class, cell: ({ name }) => words.classes[name] },
          { key: 'seen', heading: words.seen, kind: 'figures', cell: ({ seen }) => words.seenOf(seen) },
          {
            key: 'before',
            heading: words.before,
            kind: 'figures',
            cell: ({ before }) => writtenPercent(before),
          },
          {
            key: 'after',
            heading: words.after,
            kind: 'figures',
            cell: ({ after }) => writtenPercent(after),
          },
        ]}
      />
    </Sheet>
  )
}
