import { charts } from '@/lib/messages/charts'
import { hatchPath, round } from './hatch'
import { labelWidth, placeLabels } from './place-labels'
import { dayScale, shortDay, type RunLineFacts } from './run-line-scale'

const WIDTH = 640
const ROW = 18
const BAR = 10

/** The run line from left to right: names above, dates below, each row as low as there is room. */
export function RunLineAcross(facts: RunLineFacts) {
  const { steps, today, postedBy, chance } = facts
  const scale = dayScale(facts, [8, WIDTH - 8])
  const bounds = { from: 0, to: WIDTH }
  const names = steps.map((step) => ({
    text: step.name,
    centre: (scale.at(step.from) + scale.at(step.to, true)) / 2,
    width: labelWidth(step.name),
  }))
  const flag = postedBy ? [charts.postedBy, shortDay(postedBy)].join(' ') : ''
  const chanceWords = postedBy && chance !== undefined ? charts.chance(chance) : ''
  if (postedBy) names.push({ text: flag, centre: scale.at(postedBy, true), width: labelWidth(flag) + 14 })
  const nameRows = placeLabels(names, bounds)
  const starts = [...new Set(steps.map((step) => step.from))]
  const dates = starts.map((day) => ({
    text: shortDay(day),
    centre: scale.at(day),
    width: labelWidth(shortDay(day)),
    strong: false,
  }))
  if (scale.hasToday)
    dates.push({ text: charts.today, centre: scale.at(today), width: labelWidth(charts.today), strong: true })
  if (chanceWords)
    dates.push({
      text: chanceWords,
      centre: scale.at(postedBy!, true),
      width: labelWidth(chanceWords),
      strong: true,
    })
  const dateRows = placeLabels(dates, bounds)
  const above = 1 + Math.max(...nameRows.map((label) => label.row))
  const below = 1 + Math.max(...dateRows.map((label) => label.row))
  const line = above * ROW + 14
  const height = line + BAR + below * ROW + 16
  const nameY = (row: number) => line - 12 - row * ROW
  const dateY = (row: number) => line + BAR + 22 + row * ROW
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${height}`}
      aria-hidden="true"
      className="text-13 hidden h-auto w-full max-w-[52rem] sm:block"
    >
      {steps.map((step) => {
        const from = round(scale.at(step.from))
        const width = round(Math.max(1, scale.at(step.to, true) - scale.at(step.from)))
        return (
          <g key={step.key}>
            {step.state === 'done' ? (
              <rect x={from} y={line} width={width} height={BAR} className="fill-tide" />
            ) : null}
            {step.state === 'now' ? (
              <path d={hatchPath(from, line, width, BAR, 5)} className="stroke-tide" strokeWidth="1.5" />
            ) : null}
            <rect x={from} y={line} width={width} height={BAR} fill="none" className="stroke-ink" />
          </g>
        )
      })}
      {names.map((name, index) => {
        const { left, row } = nameRows[index]!
        const isFlag = postedBy !== undefined && index === names.length - 1
        const x = round(name.centre)
        return (
          <g key={index}>
            {row > 0 || isFlag ? (
              <path
                d={`M${x} ${line}V${nameY(row) + (isFlag ? -11 : 4)}`}
                className={isFlag ? 'stroke-ink' : 'stroke-quiet'}
                strokeWidth={isFlag ? 1.5 : 1}
              />
            ) : null}
            {isFlag ? (
              <path
                d={`M${x} ${nameY(row) - 11}l${x > WIDTH / 2 ? -11 : 11} 5.5L${x} ${nameY(row)}Z`}
                className="fill-ink"
              />
            ) : null}
            <text
              x={round(isFlag ? (x > WIDTH / 2 ? Math.min(x - 15, left + name.width) : x + 15) : left)}
              y={nameY(row)}
              textAnchor={isFlag && x > WIDTH / 2 ? 'end' : 'start'}
              className={`figures fill-ink ${isFlag ? 'font-semibold' : ''}`}
            >
              {name.text}
            </text>
          </g>
        )
      })}
      {dates.map((date, index) => {
        const { left, row } = dateRows[index]!
        const x = round(date.centre)
        const isToday = date.text === charts.today
        return (
          <g key={index}>
            <path
              d={`M${x} ${isToday ? line - 5 : line + BAR}V${dateY(row) - 11}`}
              className={isToday ? 'stroke-rust' : 'stroke-quiet'}
              strokeWidth={isToday ? 2 : 1}
            />
            <text
              x={round(left)}
              y={dateY(row)}
              className={`figures ${isToday ? 'fill-rust font-semibold' : date.strong ? 'fill-ink font-semibold' : 'fill-quiet'}`}
            >
              {date.text}
            </text>
          </g>
        )
      })}
    </svg>
  )
}
