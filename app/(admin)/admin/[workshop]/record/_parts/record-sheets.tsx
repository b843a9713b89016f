import { Money } from '@/components/format/money'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { TrackRecord } from '@/lib/contracts/track-record'
import { outcomeWords as words } from '@/lib/messages/outcome'
import { runWords } from '@/lib/messages/runs'
import { writtenNumber, writtenPercent } from '@/lib/messages/written'
import { paths } from '@/lib/paths'

type Props = { record: TrackRecord }

/** How many of each class order, and how many deposit holders pay. */
export function ConversionsSheet({ record }: Props) {
  return (
    <Sheet title={words.conversions} id="conversions">
      <Table
        caption={words.conversions}
        captionHidden
        rows={record.classes}
        rowKey={({ name }) => name}
        empty={words.conversionsNone}
        columns={[
          { key: 'class', heading: words.class, cell: ({ name }) => words.classes[name] },
          {
            key: 'count',
            heading: words.count,
            kind: 'figures',
            cell: ({ converted, asked }) => words.of(converted, asked),
          },
          {
            key: 'share',
            heading: words.share,
            kind: 'figures',
            cell: ({ converted, asked, low, high }) => words.shareOf(converted, asked, low, high),
          },
        ]}
      />
    </Sheet>
  )
}

/** Stated chances beside how often they came true. */
export function ScoredSheet({ record }: Props) {
  const { held, stated, brier, table } = record.forecasts
  return (
    <Sheet title={words.scored} id="scored">
      {brier === null ? null : (
        <p className="max-w-words pb-3">{words.scoredSentence(held, stated, brier)}</p>
      )}
      <Table
        caption={words.scored}
        captionHidden
        narrow="scroll"
        rows={table}
        rowKey={({ from }) => String(from)}
        empty={words.scoredNone}
        columns={[
          { key: 'stated', heading: words.stated, cell: ({ from, to }) => words.statedOf(from, to) },
          {
            key: 'times',
            heading: words.times,
            kind: 'figures',
            cell: (row) => writtenNumber(row.stated),
          },
          {
            key: 'mean',
            heading: words.meanChance,
            kind: 'figures',
            cell: ({ meanChance }) => writtenPercent(meanChance),
          },
          {
            key: 'came',
            heading: words.came,
            kind: 'figures',
            cell: (row) => `${writtenPercent(row.came / row.stated)} (${words.of(row.came, row.stated)})`,
          },
        ]}
      />
    </Sheet>
  )
}

/** Run by run: how full, how punctual, what came out good, what went back. */
export function RunsSheet({ record, slug }: Props & { slug: string }) {
  const { currency, locale } = record.workshop
  return (
    <Sheet title={words.runs} id="runs">
      <Table
        caption={words.runs}
        captionHidden
        rows={record.runs}
        rowKey={({ id }) => id}
        empty={words.runsNone}
        columns={[
          {
            key: 'run',
            heading: words.run,
            cell: ({ id, module, number }) => (
              <a href={paths.adminRunPage(slug, id, 'outcome')}>{runWords.runTitle(module, number)}</a>
            ),
          },
          {
            key: 'state',
            heading: runWords.state,
            cell: ({ state }) => runWords.states[state as keyof typeof runWords.states],
          },
          {
            key: 'deposited',
            heading: words.deposited,
            kind: 'figures',
            cell: ({ deposited, minimum }) => words.ofMinimum(deposited, minimum),
          },
          { key: 'late', heading: words.posted, cell: ({ daysLate }) => words.daysLate(daysLate) },
          {
            key: 'yield',
            heading: words.yield,
            kind: 'figures',
            cell: ({ good, started }) =>
              good === null || started === null ? '–' : words.yieldOf(good, started),
          },
          {
            key: 'refunded',
            heading: words.refunded,
            kind: 'figures',
            cell: ({ refundedMinor }) => <Money minor={refundedMinor} currency={currency} locale={locale} />,
          },
        ]}
      />
    </Sheet>
  )
}
