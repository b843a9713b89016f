import { DayText } from '@/components/format/day-text'
import { Disclosure } from '@/components/ui/disclosure'
import { Table } from '@/components/ui/table'
import { charts } from '@/lib/messages/charts'
import { ui } from '@/lib/messages/ui'
import { writtenNumber } from '@/lib/messages/written'
import { round } from './hatch'
import { shortDay } from './run-line-scale'

export type TimeBar = { from: string; value: number }

const WIDTH = 340
const HEIGHT = 120
const FOOT = 22

/** A count over days, weeks or months as bars from a common line; the sentence and the table say the same. */
export function TimeBars({
  bars,
  sentence,
  unit,
}: {
  bars: readonly TimeBar[]
  sentence: string
  unit: string
}) {
  const most = Math.max(1, ...bars.map(({ value }) => value))
  const step = WIDTH / Math.max(1, bars.length)
  const first = bars[0]
  const last = bars.at(-1)
  if (!first || !last) return null
  return (
    <figure>
      <svg
        viewBox={`0 0 ${WIDTH} ${HEIGHT + FOOT}`}
        aria-hidden="true"
        className="h-auto w-full max-w-[34rem] text-13"
      >
        <text x={0} y={11} className="figures fill-quiet">
          {writtenNumber(most)}
        </text>
        <path d={`M0 16H${WIDTH}`} className="stroke-rule" />
        {bars.map(({ from, value }, index) => {
          const height = (value / most) * (HEIGHT - 16)
          return (
            <rect
              key={from}
              x={round(index * step + step * 0.1)}
              y={round(HEIGHT - height)}
              width={round(step * 0.8)}
              height={round(height)}
              className="fill-tide"
            />
          )
        })}
        <path d={`M0 ${HEIGHT}H${WIDTH}`} className="stroke-ink" />
        <text x={0} y={HEIGHT + 16} className="figures fill-quiet">
          {shortDay(first.from)}
        </text>
        {bars.length > 1 ? (
          <text x={WIDTH} y={HEIGHT + 16} textAnchor="end" className="figures fill-quiet">
            {shortDay(last.from)}
          </text>
        ) : null}
      </svg>
      <figcaption className="max-w-words pt-2 text-15">{sentence}</figcaption>
      <Disclosure summary={ui.inTable}>
        <Table
          caption={sentence}
          captionHidden
          rows={bars}
          rowKey={({ from }) => from}
          empty={sentence}
          columns={[
            { key: 'from', heading: charts.from, cell: ({ from }) => <DayText day={from} /> },
            { key: 'value', heading: unit, kind: 'figures', cell: ({ value }) => writtenNumber(value) },
          ]}
        />
      </Disclosure>
    </figure>
  )
}
