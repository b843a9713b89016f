import { charts } from '@/lib/messages/charts'
import { hatchPath, round } from './hatch'
import { labelWidth, placeLabels } from './place-labels'
import { dayScale, shortDay, type RunLineFacts } from './run-line-scale'

const WIDTH = 720
const ROW = 18
const BAR = 10
/** Words keep their ground clear where a leader passes behind them. */
const halo = 'stroke-sheet stroke-4 [paint-order:stroke]'

type Label = {
  text: string
  centre: number
  width: number
  kind: 'name' | 'flag' | 'date' | 'today' | 'chance'
}

/** The run line from left to right: names above, dates below, each row as low as there is room. */
export function RunLineAcross(facts: RunLineFacts) {
  const scale = dayScale(facts, [8, WIDTH - 8])
  const above = labelsAbove(facts, scale.at)
  const below = labelsBelow(facts, scale)
  const bounds = { from: 0, to: WIDTH }
  const rowsAbove = placeLabels(above, bounds)
  const rowsBelow = placeLabels(below, bounds)
  const line = rows(rowsAbove) * ROW + 14
  const height = line + BAR + rows(rowsBelow) * ROW + 14
  const nameY = (row: number) => line - 12 - row * ROW
  const dateY = (row: number) => line + BAR + 22 + row * ROW
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${height}`}
      aria-hidden="true"
      className="text-13 hidden h-auto w-full max-w-[52rem] @min-[42rem]:block"
    >
      <path d={`M8 ${line + BAR / 2}H${WIDTH - 8}`} className="stroke-ink" />
      {facts.steps.map((step) => (
        <StepBar
          key={step.key}
          state={step.state}
          x={round(scale.at(step.from))}
          width={round(Math.max(1, scale.at(step.to, true) - scale.at(step.from)))}
          y={line}
        />
      ))}
      {above.map(({ kind, centre }, index) => {
        const { row } = rowsAbove[index]!
        if (kind === 'flag')
          return <Flag key={index} x={round(centre)} foot={line + BAR} top={nameY(row) - 11} />
        return row > 0 ? (
          <path key={index} d={`M${round(centre)} ${line}V${nameY(row) + 4}`} className="stroke-quiet" />
        ) : null
      })}
      {below.map(({ kind, centre }, index) => (
        <path
          key={index}
          d={`M${round(centre)} ${kind === 'today' ? line - 5 : line + BAR}V${dateY(rowsBelow[index]!.row) - 11}`}
          className={kind === 'today' ? 'stroke-rust' : 'stroke-quiet'}
          strokeWidth={kind === 'today' ? 2 : 1}
        />
      ))}
      {above.map(({ kind, text, centre, width }, index) => {
        const { left, row } = rowsAbove[index]!
        const isFlag = kind === 'flag'
        const x = isFlag ? Math.min(left, centre - width) : left
        return (
          <text
            key={index}
            x={round(x)}
            y={nameY(row)}
            className={`figures fill-ink ${halo} ${isFlag ? 'font-semibold' : ''}`}
          >
            {text}
          </text>
        )
      })}
      {below.map(({ kind, text }, index) => {
        const { left, row } = rowsBelow[index]!
        const colour =
          { today: 'fill-rust font-semibold', chance: 'fill-ink font-semibold' }[kind as string] ??
          'fill-quiet'
        return (
          <text key={index} x={round(left)} y={dateY(row)} className={`figures ${halo} ${colour}`}>
            {text}
          </text>
        )
      })}
    </svg>
  )
}

const rows = (placed: readonly { row: number }[]) => 1 + Math.max(...placed.map(({ row }) => row))

function labelsAbove(
  { steps, postedBy }: RunLineFacts,
  at: (day: string, dayEnd?: boolean) => number,
): Label[] {
  const labels: Label[] = steps.map((step) => ({
    text: step.name,
    kind: 'name',
    centre: (at(step.from) + at(step.to, true)) / 2,
    width: labelWidth(step.name),
  }))
  if (!postedBy) return labels
  // The flag's words stand before its pole, so their place is taken from the pole leftwards.
  const text = `${charts.postedBy} ${shortDay(postedBy)}`
  const width = labelWidth(text) + 16
  return [...labels, { text, kind: 'flag', centre: Math.max(at(postedBy, true), width), width }]
}

function labelsBelow(
  { steps, today, postedBy, chance }: RunLineFacts,
  scale: ReturnType<typeof dayScale>,
): Label[] {
  const label = (text: string, kind: Label['kind'], centre: number) => ({
    text,
    kind,
    centre,
    width: labelWidth(text),
  })
  const labels = [...new Set(steps.map((step) => step.from))].map((day) =>
    label(shortDay(day), 'date', scale.at(day)),
  )
  if (scale.hasToday) labels.push(label(charts.today, 'today', scale.at(today)))
  if (postedBy && chance !== undefined)
    labels.push(label(charts.chance(chance), 'chance', scale.at(postedBy, true)))
  return labels
}

function StepBar({
  state,
  x,
  y,
  width,
}: {
  state: 'done' | 'now' | 'to_come'
  x: number
  y: number
  width: number
}) {
  return (
    <g>
      <rect
        x={x}
        y={y}
        width={width}
        height={BAR}
        className={state === 'done' ? 'fill-tide' : 'fill-sheet'}
      />
      {state === 'now' ? (
        <path d={hatchPath(x, y, width, BAR, 5)} className="stroke-tide" strokeWidth="1.5" />
      ) : null}
      <rect x={x} y={y} width={width} height={BAR} fill="none" className="stroke-ink" />
    </g>
  )
}

function Flag({ x, foot, top }: { x: number; foot: number; top: number }) {
  return (
    <g>
      <path d={`M${x} ${foot}V${top}`} className="stroke-ink" strokeWidth="1.5" />
      <path d={`M${x} ${top}l-11 5.5L${x} ${top + 11}Z`} className="fill-ink" />
    </g>
  )
}
