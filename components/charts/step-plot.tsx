import { scaleLinear } from 'd3-scale'
import { curveStep, line as lineOf } from 'd3-shape'
import { charts } from '@/lib/messages/charts'
import { LOCALE } from '@/lib/messages/ui'
import { writtenNumber, writtenRoundMoney } from '@/lib/messages/written'
import { round } from './hatch'
import { labelWidth, placeLabels } from './place-labels'
import type { StepChartFacts } from './step-chart'

const WIDTHS = { wide: 720, narrow: 340 }
const PLOT = { left: 68, aside: 12, height: 232 }
const ROW = 17

/** The drawing of the step chart alone. */
export function StepPlot({ across, ...facts }: StepChartFacts & { across: 'wide' | 'narrow' }) {
  const { profits, currency, locale = LOCALE, forecast } = facts
  const last = profits.length
  const width = WIDTHS[across]
  const right = width - PLOT.aside
  const ticks = across === 'wide' ? 8 : 4
  // Half a unit of room at both ends: each step stands centred on its quantity.
  const x = scaleLinear([0.5, last + 0.5], [PLOT.left, right])
  const marks = marksOf(facts).map((mark) => ({
    ...mark,
    centre: x(mark.units),
    width: labelWidth(mark.text),
  }))
  const rows = placeLabels(marks, { from: PLOT.left, to: width, gap: 10 })
  const top = 10 + ROW * (1 + Math.max(0, ...rows.map((label) => label.row)))
  const bottom = top + PLOT.height
  const y = scaleLinear([Math.min(0, ...profits), Math.max(0, ...profits)], [bottom, top + 8]).nice(5)
  const zero = round(y(0))
  const path = lineOf<number>(
    (_, index) => round(x(index + 1)),
    (profit) => round(y(profit)),
  ).curve(curveStep)(profits)
  const profitAt = (units: number) => profits[Math.min(Math.max(Math.round(units), 1), last) - 1] ?? 0
  return (
    <svg
      viewBox={`0 0 ${width} ${bottom + 40}`}
      aria-hidden="true"
      className={`text-13 h-auto w-full ${across === 'wide' ? 'hidden max-w-[52rem] @min-[42rem]:block' : 'max-w-[30rem] @min-[42rem]:hidden'}`}
    >
      {y.ticks(5).map((tick) => (
        <g key={tick}>
          <path d={`M${PLOT.left} ${round(y(tick))}H${right}`} className="stroke-rule" />
          <text x={PLOT.left - 8} y={round(y(tick)) + 4} textAnchor="end" className="figures fill-quiet">
            {writtenRoundMoney(tick, currency, { locale })}
          </text>
        </g>
      ))}
      <path d={lossLines(x, y, profits)} className="stroke-rust" strokeWidth="1" />
      <path d={`M${PLOT.left} ${zero}H${right}`} className="stroke-ink" strokeWidth="1" />
      <path
        d={`M${PLOT.left} ${bottom}H${right}${x
          .ticks(ticks)
          .filter(Number.isInteger)
          .map((tick) => `M${round(x(tick))} ${bottom}v5`)
          .join('')}`}
        className="stroke-quiet"
      />
      {x
        .ticks(ticks)
        .filter(Number.isInteger)
        .map((tick) => (
          <text
            key={tick}
            x={round(x(tick))}
            y={bottom + 18}
            textAnchor="middle"
            className="figures fill-quiet"
          >
            {writtenNumber(tick, { locale })}
          </text>
        ))}
      <text x={right} y={bottom + 34} textAnchor="end" className="figures fill-quiet">
        {charts.axisUnits}
      </text>
      {path ? <path d={path} fill="none" className="stroke-ink" strokeWidth="2" /> : null}
      {forecast ? (
        <ForecastBracket
          low={x(Math.min(forecast.low, last))}
          high={x(Math.min(forecast.high, last))}
          mean={x(Math.min(forecast.mean, last))}
          y={bottom - 7}
        />
      ) : null}
      {marks.map((mark, index) => (
        <path
          key={mark.text}
          d={`M${round(mark.centre)} ${16 + rows[index]!.row * ROW}V${round(y(profitAt(mark.units)))}`}
          className="stroke-quiet"
          strokeDasharray="2 3"
        />
      ))}
      {marks.map((mark, index) => {
        const label = rows[index]!
        const at = round(mark.centre)
        const labelY = 12 + label.row * ROW
        const end = round(y(profitAt(mark.units)))
        return (
          <g key={mark.text}>
            <text
              x={round(label.left)}
              y={labelY}
              className="figures fill-ink stroke-sheet stroke-4 font-semibold [paint-order:stroke]"
            >
              {mark.text}
            </text>
            <MarkShape kind={mark.kind} x={at} y={end} />
          </g>
        )
      })}
    </svg>
  )
}

type MarkKind = 'filled' | 'open' | 'tick'

function marksOf({ profits, deposited, minimum, forecast, breakEven }: StepChartFacts) {
  const last = profits.length
  const marks: { text: string; units: number; kind: MarkKind }[] = []
  const add = (words: string, units: number | null | undefined, kind: MarkKind) => {
    if (units && units >= 1 && units <= last)
      marks.push({ text: `${words} ${writtenNumber(Math.round(units))}`, units, kind })
  }
  add(charts.depositsNow, deposited, 'filled')
  add(charts.breakEven, breakEven.firstProfit, 'open')
  add(charts.minimum.toLowerCase(), minimum, 'tick')
  add(charts.forecast, forecast?.mean, 'tick')
  return marks
}

function MarkShape({ kind, x, y }: { kind: MarkKind; x: number; y: number }) {
  if (kind === 'tick') return <path d={`M${x - 4} ${y}h8`} className="stroke-ink" strokeWidth="2" />
  return (
    <circle
      cx={x}
      cy={y}
      r="5"
      className={kind === 'filled' ? 'fill-tide stroke-sheet' : 'fill-sheet stroke-ink'}
      strokeWidth="1.75"
    />
  )
}

/** The 80 % range on the foot of the plot, its expected value as a tick. */
function ForecastBracket({ low, high, mean, y }: { low: number; high: number; mean: number; y: number }) {
  return (
    <path
      d={`M${round(low)} ${y - 5}v5H${round(high)}v-5M${round(mean)} ${y - 8}v8`}
      fill="none"
      className="stroke-tide"
      strokeWidth="2"
    />
  )
}

/** Upright hatching between the zero line and the curve wherever there is a loss, a line every 4 px. */
function lossLines(
  x: { (units: number): number; invert: (at: number) => number },
  y: (profit: number) => number,
  profits: readonly number[],
): string {
  const lines: string[] = []
  for (let at = x(1); at <= x(profits.length); at += 4) {
    const profit = profits[Math.min(Math.max(Math.round(x.invert(at)), 1), profits.length) - 1] ?? 0
    if (profit < 0) lines.push(`M${round(at)} ${round(y(0))}V${round(y(profit))}`)
  }
  return lines.join('')
}
