import { scaleLinear } from 'd3-scale'
import { charts } from '@/lib/messages/charts'
import { writtenNumber } from '@/lib/messages/written'
import { hatchPath, round } from './hatch'
import { labelWidth } from './place-labels'

export type GaugeLevels = {
  /** Units of orders under deposit. */
  deposited: number
  minimum: number
  maximum: number
  /** Units in the end, those under deposit included; low and high bound the 80 % range. */
  forecast?: { mean: number; low: number; high: number }
}

const sizes = {
  small: { width: 36, height: 40, tube: 16, left: 10, top: 3, bottom: 2, labels: false, ticks: 3, line: 1.5 },
  medium: {
    width: 196,
    height: 176,
    tube: 44,
    left: 40,
    top: 18,
    bottom: 10,
    labels: true,
    ticks: 4,
    line: 2,
  },
  large: {
    width: 244,
    height: 288,
    tube: 64,
    left: 48,
    top: 20,
    bottom: 12,
    labels: true,
    ticks: 6,
    line: 2,
  },
}

/** The drawing of the gauge alone; the sentence beside it says the same, so it is not read out twice. */
export function GaugeTube({
  size,
  deposited,
  minimum,
  maximum,
  forecast,
}: GaugeLevels & { size: keyof typeof sizes }) {
  const box = sizes[size]
  // A forecast far above the maximum would squash what can really be taken: the scale ends a quarter above it.
  const top = Math.max(maximum, Math.min(forecast?.high ?? 0, maximum * 1.25), deposited, 1)
  const floor = box.height - box.bottom
  const y = scaleLinear([0, top], [floor, box.top])
  const right = box.left + box.tube
  const words = [charts.maximumAt(maximum), charts.minimumAt(minimum)]
  const width = box.labels
    ? Math.ceil(right + 32 + Math.max(...words.map((text) => labelWidth(text, 15))))
    : box.width
  const fill = round(y(Math.min(deposited, top)))
  const mean = forecast ? round(y(Math.min(Math.max(forecast.mean, deposited), top))) : fill
  const inTube = floor - fill >= 26
  return (
    <svg
      width={width}
      height={box.height}
      viewBox={`0 0 ${width} ${box.height}`}
      aria-hidden="true"
      className="text-15 shrink-0"
    >
      <rect x={box.left} y={fill} width={box.tube} height={round(floor - fill)} className="fill-tide" />
      {forecast ? (
        <path
          d={hatchPath(box.left, mean, box.tube, fill - mean, size === 'small' ? 4 : 6)}
          className="stroke-tide"
          strokeWidth={size === 'small' ? 1 : 1.5}
        />
      ) : null}
      {forecast ? <path d={`M${box.left} ${mean}H${right}`} className="stroke-tide" strokeWidth="1" /> : null}
      <path
        d={`M${box.left} ${box.top}V${floor}H${right}V${box.top}`}
        fill="none"
        className="stroke-ink"
        strokeWidth={box.line}
      />
      <Scale y={y} ticks={y.ticks(box.ticks).filter(Number.isInteger)} left={box.left} labels={box.labels} />
      {forecast ? (
        <Bracket
          x={right + (size === 'small' ? 3 : 7)}
          low={y(forecast.low)}
          high={y(Math.min(forecast.high, top))}
          open={forecast.high > top}
        />
      ) : null}
      <Level at={y(maximum)} from={right - box.tube * 0.4} to={right + (box.labels ? 24 : 4)} weight={1.25} />
      <Level
        at={y(minimum)}
        from={box.left - (box.labels ? 10 : 6)}
        to={box.labels ? width : right + 10}
        weight={size === 'small' ? 1.75 : 2.5}
      />
      {box.labels ? (
        <>
          <text x={right + 28} y={round(y(maximum)) - 5} className="figures fill-quiet">
            {charts.maximumAt(maximum)}
          </text>
          <text x={right + 28} y={round(y(minimum)) + 16} className="figures fill-ink font-semibold">
            {charts.minimumAt(minimum)}
          </text>
          {inTube ? (
            <text
              x={box.left + box.tube / 2}
              y={Math.max(fill + 19, belowBrim(fill, y(minimum)))}
              textAnchor="middle"
              className="figures fill-paper font-semibold"
            >
              {writtenNumber(deposited)}
            </text>
          ) : null}
        </>
      ) : null}
    </svg>
  )
}

/** The figure in the fill keeps clear of the brim line where that runs through its place. */
function belowBrim(fill: number, brim: number): number {
  return brim > fill && brim < fill + 24 ? brim + 19 : 0
}

function Scale({
  y,
  ticks,
  left,
  labels,
}: {
  y: (units: number) => number
  ticks: number[]
  left: number
  labels: boolean
}) {
  return (
    <g>
      <path
        d={ticks.map((tick) => `M${left} ${round(y(tick))}h${labels ? -6 : -4}`).join('')}
        className="stroke-quiet"
      />
      {labels
        ? ticks.map((tick) => (
            <text
              key={tick}
              x={left - 12}
              y={round(y(tick)) + 4}
              textAnchor="end"
              className="figures fill-quiet"
            >
              {writtenNumber(tick)}
            </text>
          ))
        : null}
    </g>
  )
}

function Level({ at, from, to, weight }: { at: number; from: number; to: number; weight: number }) {
  return <path d={`M${round(from)} ${round(at)}H${round(to)}`} className="stroke-ink" strokeWidth={weight} />
}

/** The 80 % range; without its upper lip where it goes on beyond the scale. */
function Bracket({ x, low, high, open }: { x: number; low: number; high: number; open: boolean }) {
  return (
    <path
      d={`M${x} ${round(low)}h5V${round(high)}${open ? '' : 'h-5'}`}
      fill="none"
      className="stroke-ink"
      strokeWidth="1.5"
    />
  )
}
