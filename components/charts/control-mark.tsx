import { round } from './hatch'

/** Something on a front panel; millimetres from its top left corner to the centre. */
export type FrontPanelControl = {
  kind: 'knob' | 'jack' | 'switch' | 'button' | 'light' | 'slider' | 'display'
  label: string
  xMm: number
  yMm: number
  /** Diameter, or the longer side; millimetres. */
  sizeMm: number
}

type Props = { control: FrontPanelControl; scale: number; left: number; top: number; labelled: boolean }

/** One control as a drawing shows it, with its label beneath. */
export function ControlMark({ control, scale, left, top, labelled }: Props) {
  const x = round(left + control.xMm * scale)
  const y = round(top + control.yMm * scale)
  const r = round((control.sizeMm / 2) * scale)
  return (
    <g className="stroke-ink" fill="none">
      <Shape kind={control.kind} x={x} y={y} r={r} />
      {labelled && control.label ? (
        <text
          x={x}
          y={round(y + halfHeight(control.kind, r) + 11)}
          textAnchor="middle"
          stroke="none"
          className="figures fill-ink text-[10px]"
        >
          {control.label}
        </text>
      ) : null}
    </g>
  )
}

/** How far a mark reaches below its centre. */
function halfHeight(kind: FrontPanelControl['kind'], r: number): number {
  return kind === 'display' ? r * 0.5 : r
}

function Shape({ kind, x, y, r }: { kind: FrontPanelControl['kind']; x: number; y: number; r: number }) {
  const at = (part: number) => round(r * part)
  switch (kind) {
    case 'knob':
      return (
        <>
          <circle cx={x} cy={y} r={r} className="fill-paper" strokeWidth="1.25" />
          <circle cx={x} cy={y} r={at(0.72)} />
          <path d={`M${x} ${round(y - r * 0.3)}V${round(y - r)}`} strokeWidth="2" />
        </>
      )
    case 'jack':
      return (
        <>
          <circle cx={x} cy={y} r={r} className="fill-paper" />
          <circle cx={x} cy={y} r={at(0.72)} />
          <circle cx={x} cy={y} r={at(0.4)} className="fill-ink" />
        </>
      )
    case 'switch':
      return (
        <>
          <circle cx={x} cy={y} r={r} className="fill-paper" />
          <path
            d={`M${x} ${y}V${round(y - r * 0.85)}`}
            strokeWidth={Math.max(2, at(0.35))}
            strokeLinecap="round"
          />
        </>
      )
    case 'button':
      return (
        <>
          <rect
            x={round(x - r)}
            y={round(y - r)}
            width={2 * r}
            height={2 * r}
            rx="1"
            className="fill-paper"
          />
          <circle cx={x} cy={y} r={at(0.7)} />
        </>
      )
    case 'light':
      return <circle cx={x} cy={y} r={r} className="fill-straw" />
    case 'slider':
      return (
        <>
          <path d={`M${x} ${round(y - r)}V${round(y + r)}`} strokeWidth="3" strokeLinecap="round" />
          <rect
            x={round(x - Math.max(5, r * 0.28))}
            y={round(y - 3)}
            width={round(Math.max(10, r * 0.56))}
            height="7"
            className="fill-paper"
          />
        </>
      )
    case 'display':
      return <rect x={round(x - r)} y={round(y - r * 0.5)} width={2 * r} height={r} className="fill-ink" />
  }
}
