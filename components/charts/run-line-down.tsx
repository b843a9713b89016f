import { charts } from '@/lib/messages/charts'
import { hatchPath, round } from './hatch'
import { labelWidth } from './place-labels'
import { dayScale, shortDay, type RunLineFacts } from './run-line-scale'

const WIDTH = 288
const BAR_X = 62
const BAR = 10
const LINE = 17
/** Where words begin, right of the bar and the leaders. */
const WORDS_X = BAR_X + BAR + 16
const FLAG = 12

type Entry = { at: number; date: string; lines: string[]; strong?: 'today' | 'flag' }

/** The run line from top to bottom, for a phone; entries that would touch move down and keep a leader to their day. */
export function RunLineDown(facts: RunLineFacts) {
  const { steps, today, postedBy, chance } = facts
  const length = Math.max(220, steps.length * 44)
  const scale = dayScale(facts, [12, 12 + length])
  const entries: Entry[] = steps.map((step) => ({
    at: scale.at(step.from),
    date: shortDay(step.from),
    lines: broken(step.name, WIDTH - WORDS_X),
  }))
  if (scale.hasToday)
    entries.push({ at: scale.at(today), date: shortDay(today), lines: [charts.today], strong: 'today' })
  if (postedBy)
    entries.push({
      at: scale.at(postedBy, true),
      date: shortDay(postedBy),
      lines: chance === undefined ? [charts.postedBy] : [`${charts.postedBy},`, charts.chance(chance)],
      strong: 'flag',
    })
  entries.sort((a, b) => a.at - b.at)
  const ys = spread(
    entries.map((entry) => entry.at),
    entries.map(({ lines }) => lines.length * LINE + 1),
  )
  const foot = (ys.at(-1) ?? 0) + (entries.at(-1)?.lines.length ?? 0) * LINE
  const height = Math.max(length + 24, foot + 6)
  return (
    <svg
      width={WIDTH}
      height={round(height)}
      viewBox={`0 0 ${WIDTH} ${round(height)}`}
      aria-hidden="true"
      className="max-w-full text-13 @min-[42rem]:hidden"
    >
      {steps.map((step) => (
        <StepBar
          key={step.key}
          state={step.state}
          from={round(scale.at(step.from))}
          size={round(Math.max(1, scale.at(step.to, true) - scale.at(step.from)))}
        />
      ))}
      {entries.map((entry, index) => (
        <EntryWords key={index} entry={entry} y={round(ys[index]!)} />
      ))}
    </svg>
  )
}

function StepBar({ state, from, size }: { state: 'done' | 'now' | 'to_come'; from: number; size: number }) {
  return (
    <g>
      {state === 'done' ? <rect x={BAR_X} y={from} width={BAR} height={size} className="fill-tide" /> : null}
      {state === 'now' ? (
        <path d={hatchPath(BAR_X, from, BAR, size, 5)} className="stroke-tide" strokeWidth="1.5" />
      ) : null}
      <rect x={BAR_X} y={from} width={BAR} height={size} fill="none" className="stroke-ink" />
    </g>
  )
}

const COLOURS = { today: 'fill-rust font-semibold', flag: 'fill-ink font-semibold', step: 'fill-ink' }

function EntryWords({ entry, y }: { entry: Entry; y: number }) {
  const at = round(entry.at)
  const right = BAR_X + BAR
  const isToday = entry.strong === 'today'
  const isFlag = entry.strong === 'flag'
  return (
    <g>
      <path
        d={`M${isToday ? BAR_X - 4 : right} ${at}H${right + 4}L${right + 12} ${y}`}
        fill="none"
        className={isToday ? 'stroke-rust' : 'stroke-quiet'}
        strokeWidth={isToday ? 2 : 1}
      />
      {isFlag ? <path d={`M${right + 12} ${y - 6}l10 6l-10 6Z`} className="fill-ink" /> : null}
      <text x={BAR_X - 8} y={y + 4} textAnchor="end" className="figures fill-quiet">
        {entry.date}
      </text>
      {entry.lines.map((line, index) => (
        <text
          key={index}
          x={WORDS_X + (isFlag ? FLAG : 0)}
          y={y + 4 + index * LINE}
          className={`figures ${COLOURS[entry.strong ?? 'step']}`}
        >
          {line}
        </text>
      ))}
    </g>
  )
}

/** Words in lines no wider than there is room; a single word that is wider stays whole. */
function broken(words: string, room: number): string[] {
  const lines: string[] = []
  for (const word of words.split(' ')) {
    const longer = lines.length === 0 ? word : `${lines.at(-1)} ${word}`
    if (lines.length === 0 || labelWidth(longer) > room) lines.push(word)
    else lines[lines.length - 1] = longer
  }
  return lines
}

/** Positions in order, moved down just as far as the heights of those before them ask. */
export function spread(positions: readonly number[], heights: readonly number[]): number[] {
  const moved: number[] = []
  positions.forEach((position, index) => {
    const free = index === 0 ? -Infinity : moved[index - 1]! + (heights[index - 1] ?? 0)
    moved.push(Math.max(position, free))
  })
  return moved
}
