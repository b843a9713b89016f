import { scaleLinear } from 'd3-scale'
import { charts } from '@/lib/messages/charts'
import { LOCALE } from '@/lib/messages/ui'
import { writtenMonth, writtenRoundMoney } from '@/lib/messages/written'
import type { BalanceChartFacts } from './balance-chart'
import { round } from './hatch'

const WIDTHS = { wide: 720, narrow: 340 }
const PLOT = { left: 68, aside: 12, top: 22, height: 180 }
const DAY_MS = 86_400_000

const dayNumber = (day: string) => Date.parse(`${day}T00:00:00Z`) / DAY_MS

/** The drawing of the balance chart alone: the balance keeps its height until the next movement. */
export function BalancePlot(facts: BalanceChartFacts & { across: 'wide' | 'narrow' }) {
  const { series, currency, locale = LOCALE, low, lowOn, limit, across } = facts
  const width = WIDTHS[across]
  const right = width - PLOT.aside
  const bottom = PLOT.top + PLOT.height
  const days = series.map(({ day }) => dayNumber(day))
  const [first, last] = [days[0]! - 2, days.at(-1)! + 5]
  const x = scaleLinear([first, last], [PLOT.left, right])
  const balances = series.map(({ balance }) => balance)
  const floor = limit === null ? 0 : -limit
  const y = scaleLinear([Math.min(0, floor, ...balances), Math.max(0, ...balances)], [bottom, PLOT.top]).nice(
    5,
  )
  const path = series.reduce(
    (drawn, { balance }, i) => `${drawn}H${round(x(days[i]!))}V${round(y(balance))}`,
    `M${PLOT.left} ${round(y(0))}`,
  )
  const lowX = lowOn === null ? PLOT.left : round(x(dayNumber(lowOn)))
  const isRight = lowX > width / 2
  return (
    <svg
      viewBox={`0 0 ${width} ${bottom + 24}`}
      aria-hidden="true"
      className={`h-auto w-full text-13 ${across === 'wide' ? 'hidden max-w-[52rem] @min-[42rem]:block' : 'max-w-[30rem] @min-[42rem]:hidden'}`}
    >
      {y.ticks(5).map((tick) => (
        <g key={tick}>
          <path d={`M${PLOT.left} ${round(y(tick))}H${right}`} className="stroke-rule" />
          <text x={PLOT.left - 8} y={round(y(tick)) + 4} textAnchor="end" className="figures fill-quiet">
            {writtenRoundMoney(tick, currency, { locale })}
          </text>
        </g>
      ))}
      {monthsBetween(first, last, across === 'wide' ? 1 : 2).map(({ at, day }) => (
        <g key={at}>
          <path d={`M${round(x(at))} ${bottom}v5`} className="stroke-quiet" />
          <text x={round(x(at))} y={bottom + 18} textAnchor="middle" className="figures fill-quiet">
            {writtenMonth(day, { locale })}
          </text>
        </g>
      ))}
      <path d={`M${PLOT.left} ${bottom}H${right}`} className="stroke-quiet" />
      <path d={`M${PLOT.left} ${round(y(0))}H${right}`} className="stroke-ink" strokeWidth="1" />
      {limit === null ? null : (
        <>
          <path
            d={`M${PLOT.left} ${round(y(floor))}H${right}`}
            className="stroke-rust"
            strokeWidth="1.5"
            strokeDasharray="6 4"
          />
          <text
            x={right}
            y={round(y(floor)) - 5}
            textAnchor="end"
            className="figures fill-ink stroke-sheet stroke-4 [paint-order:stroke]"
          >
            {charts.limit}
          </text>
        </>
      )}
      <path d={`${path}H${right}`} fill="none" className="stroke-ink" strokeWidth="2" />
      {low < 0 ? (
        <>
          <circle cx={lowX} cy={round(y(low))} r="5" className="fill-sheet stroke-rust" strokeWidth="1.75" />
          <text
            x={isRight ? lowX - 10 : lowX + 10}
            y={round(y(low)) - 8}
            textAnchor={isRight ? 'end' : 'start'}
            className="figures fill-ink stroke-sheet stroke-4 font-semibold [paint-order:stroke]"
          >
            {charts.lowest}
          </text>
        </>
      ) : null}
    </svg>
  )
}

/** The first days of months between two days, every so many months. */
function monthsBetween(from: number, to: number, every: number): { at: number; day: string }[] {
  const begin = new Date(from * DAY_MS)
  const found: { at: number; day: string }[] = []
  for (let step = 1; found.length < 40; step += every) {
    const at = Date.UTC(begin.getUTCFullYear(), begin.getUTCMonth() + step, 1) / DAY_MS
    if (at > to) break
    found.push({ at, day: new Date(at * DAY_MS).toISOString().slice(0, 10) })
  }
  return found
}
