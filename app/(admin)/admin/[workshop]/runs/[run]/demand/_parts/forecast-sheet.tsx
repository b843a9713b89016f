import { FillGauge } from '@/components/charts/fill-gauge'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { DemandBoard } from '@/lib/contracts/demand'
import { demandWords as words } from '@/lib/messages/demand'
import { writtenNumber } from '@/lib/messages/written'

/** Units in the end, per offer and together, and what they are made of. */
export function ForecastSheet({ board }: { board: DemandBoard }) {
  const { isExpecting, byForecast, total, deposited, run } = board
  const { mean, low, high } = total
  const fits = (units: number) => Math.min(units, run.maximum)
  const rows = [...byForecast, { offer: '', deposited, mean, low, high }]
  return (
    <Sheet title={words.forecast} id="forecast">
      <p className="max-w-words pb-3 text-17">
        {isExpecting ? words.forecastSentence(board) : words.forecastOver}
      </p>
      <FillGauge
        size="medium"
        deposited={deposited}
        minimum={run.minimum}
        maximum={run.maximum}
        {...(isExpecting && { forecast: { mean: fits(mean), low: fits(low), high: fits(high) } })}
      />
      <div className="pt-4">
        <Table
          caption={words.forecast}
          captionHidden
          narrow="scroll"
          rows={rows}
          rowKey={({ offer }) => offer}
          empty={words.none}
          columns={[
            {
              key: 'offer',
              heading: words.offer,
              cell: ({ offer }) => (offer === '' ? words.all : (words.offers[offer] ?? offer)),
            },
            {
              key: 'deposited',
              heading: words.deposited,
              kind: 'figures',
              cell: (row) => writtenNumber(row.deposited),
            },
            { key: 'mean', heading: words.expected, kind: 'figures', cell: (row) => words.tenth(row.mean) },
            {
              key: 'range',
              heading: words.range,
              kind: 'figures',
              cell: (row) => words.rangeOf(row.low, row.high),
            },
          ]}
        />
      </div>
      {isExpecting ? (
        <ul className="flex max-w-words list-disc flex-col gap-1 pt-3 pl-5 text-15">
          {words.madeOf(board).map((sentence) => (
            <li key={sentence}>{sentence}</li>
          ))}
        </ul>
      ) : null}
    </Sheet>
  )
}
