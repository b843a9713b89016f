import { charts } from '@/lib/messages/charts'
import { hatchPath, round } from './hatch'
import { dayScale, shortDay, type RunLineFacts } from './run-line-scale'

const WIDTH = 288
const BAR_X = 62
const BAR = 10

type Entry = { at: number; date: string; words: string; strong?: 'today' | 'flag' }

/** The run line from top to bottom, for a phone; entries that would touch move down and keep a leader to their day. */
export function RunLineDown(facts: RunLineFacts) {
  const { steps, today, postedBy, chance } = facts
  const length = Math.max(220, steps.length * 44)
  const scale = dayScale(facts, [12, 12 + length])
  const entries: Entry[] = steps.map((step) => ({
    at: scale.at(step.from),
    date: shortDay(step.from),
    words: step.name,
  }))
  if (scale.hasToday)
    entries.push({ at: scale.at(today), date: shortDay(today), words: charts.today, strong: 'today' })
  if (postedBy)
    entries.push({
      at: scale.at(postedBy, true),
      date: shortDay(postedBy),
      words: chance === undefined ? charts.postedBy : `${charts.postedBy}, ${charts.chance(chance)}`,
      strong: 'flag',
    })
  entries.sort((a, b) => a.at - b.at)
  const ys = spread(
    entries.map((entry) => entry.at),
    18,
  )
  const height = Math.max(length + 24, (ys.at(-1) ?? 0) + 12)
  const right = BAR_X + BAR
  return (
    <svg
      width={WIDTH}
      height={round(height)}
      viewBox={`0 0 ${WIDTH} ${round(height)}`}
      aria-hidden="true"
      className="text-13 max-w-full @min-[42rem]:hidden"
    >
      {steps.map((step) => {
        const from = round(scale.at(step.from))
        const size = round(Math.max(1, scale.at(step.to, true) - scale.at(step.from)))
        return (
          <g key={step.key}>
            {step.state === 'done' ? (
              <rect x={BAR_X} y={from} width={BAR} height={size} className="fill-tide" />
            ) : null}
            {step.state === 'now' ? (
              <path d={hatchPath(BAR_X, from, BAR, size, 5)} className="stroke-tide" strokeWidth="1.5" />
            ) : null}
            <rect x={BAR_X} y={from} width={BAR} height={size} fill="none" className="stroke-ink" />
          </g>
        )
      })}
      {entries.map((entry, index) => {
        const y = round(ys[index]!)
        const at = round(entry.at)
        const colour =
          entry.strong === 'today'
            ? 'fill-rust font-semibold'
            : entry.strong === 'flag'
              ? 'fill-ink font-semibold'
              : 'fill-ink'
        return (
          <g key={index}>
            <path
              d={`M${entry.strong === 'today' ? BAR_X - 4 : right} ${at}H${right + 4}L${right + 12} ${y}`}
              fill="none"
              className={entry.strong === 'today' ? 'stroke-rust' : 'stroke-quiet'}
              strokeWidth={entry.strong === 'today' ? 2 : 1}
            />
            {entry.strong === 'flag' ? (
              <path d={`M${right + 12} ${y - 6}l10 6l-10 6Z`} className="fill-ink" />
            ) : null}
            <text x={BAR_X - 8} y={y + 4} textAnchor="end" className="figures fill-quiet">
              {entry.date}
            </text>
            <text x={right + (entry.strong === 'flag' ? 28 : 16)} y={y + 4} className={`figures ${colour}`}>
              {entry.words}
            </text>
          </g>
        )
      })}
    </svg>
  )
}

/** Positions in order, moved down just as far as `gap` asks. */
export function spread(positions: readonly number[], gap: number): number[] {
  const moved: number[] = []
  for (const position of positions) moved.push(Math.max(position, (moved.at(-1) ?? -Infinity) + gap))
  return moved
}
