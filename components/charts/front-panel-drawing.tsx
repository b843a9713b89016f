import { HOLE_MM, PANEL_HEIGHT_MM_3U, holeCentresMm, panelWidthMm } from '@/lib/core/rack/front-panel'
import { Disclosure } from '@/components/ui/disclosure'
import { Table } from '@/components/ui/table'
import { charts } from '@/lib/messages/charts'
import { ControlMark, type FrontPanelControl } from './control-mark'
import { round } from './hatch'

export type { FrontPanelControl } from './control-mark'

type Props = {
  widthHp: number
  controls: readonly FrontPanelControl[]
  /** What the drawing is of: the module's name. */
  name: string
  /** 'plain' leaves out dimensions, labels and the table: for a list of modules. */
  size?: 'plain' | 'full'
}

/** A front panel to scale with its dimensions in mm and HP, a sentence, and its controls as a table. */
export function FrontPanelDrawing({ widthHp, controls, name, size = 'full' }: Props) {
  const full = size === 'full'
  const widthMm = panelWidthMm(widthHp)
  // 3 px to the millimetre; a very wide front panel is drawn smaller rather than cut off.
  const scale = full ? Math.min(3, 560 / widthMm) : 1.2
  const left = full ? 44 : 1
  const top = 1
  const width = widthMm * scale
  const height = PANEL_HEIGHT_MM_3U * scale
  const box = { width: round(left + width + (full ? 8 : 1)), height: round(top + height + (full ? 48 : 1)) }
  const sentence = charts.frontPanel(widthHp, widthMm, PANEL_HEIGHT_MM_3U, countKinds(controls))
  const drawing = (
    <svg
      width={box.width}
      height={box.height}
      viewBox={`0 0 ${box.width} ${box.height}`}
      role="img"
      aria-label={`${name}. ${sentence}`}
      className="text-13 h-auto max-w-full"
    >
      <rect
        x={left}
        y={top}
        width={round(width)}
        height={round(height)}
        className="fill-sheet stroke-ink"
        strokeWidth="1.5"
      />
      {holeCentresMm(widthHp).map(({ x, y }) => (
        <circle
          key={`${x} ${y}`}
          cx={round(left + x * scale)}
          cy={round(top + y * scale)}
          r={round((HOLE_MM / 2) * scale)}
          className="fill-paper stroke-quiet"
        />
      ))}
      {controls.map((control, index) => (
        <ControlMark key={index} control={control} scale={scale} left={left} top={top} labelled={full} />
      ))}
      {full ? <Dimensions {...{ left, top, width, height, widthMm, widthHp }} /> : null}
    </svg>
  )
  if (!full) return drawing
  return (
    <figure>
      {drawing}
      <figcaption className="text-13 text-quiet max-w-80 pt-1">{sentence}</figcaption>
      <Disclosure summary={charts.controlsCaption}>
        <Table
          caption={charts.controlsCaption}
          captionHidden
          rows={controls.map((control, index) => ({ ...control, key: String(index) }))}
          rowKey={(row) => row.key}
          empty={charts.noControls}
          columns={[
            {
              key: 'label',
              heading: charts.control,
              cell: (row) => row.label || charts.controlKind[row.kind],
            },
            { key: 'kind', heading: charts.kind, cell: (row) => charts.controlKind[row.kind] },
            { key: 'x', heading: charts.fromLeft, kind: 'figures', cell: (row) => row.xMm.toFixed(1) },
            { key: 'y', heading: charts.fromTop, kind: 'figures', cell: (row) => row.yMm.toFixed(1) },
          ]}
        />
      </Disclosure>
    </figure>
  )
}

function countKinds(controls: readonly FrontPanelControl[]): string[] {
  const kinds = Object.keys(charts.controls) as FrontPanelControl['kind'][]
  return kinds
    .map((kind) => ({ kind, count: controls.filter((control) => control.kind === kind).length }))
    .filter(({ count }) => count > 0)
    .map(({ kind, count }) => charts.controls[kind](count))
}

type Frame = { left: number; top: number; width: number; height: number; widthMm: number; widthHp: number }

/** Dimension lines with arrow heads: height at the left, width in mm and HP at the foot. */
function Dimensions({ left, top, width, height, widthMm, widthHp }: Frame) {
  const foot = round(top + height + 16)
  const side = left - 16
  const right = round(left + width)
  const bottom = round(top + height)
  const middle = round(top + height / 2)
  return (
    <g className="stroke-quiet" fill="none">
      <path
        d={`M${left} ${bottom + 4}V${foot + 5}M${right} ${bottom + 4}V${foot + 5}M${left} ${foot}H${right}`}
      />
      <path
        d={`M${side - 5} ${top}H${left - 4}M${side - 5} ${bottom}H${left - 4}M${side} ${top}V${bottom}`}
      />
      <path
        d={`M${left + 7} ${foot - 3}L${left} ${foot}l7 3M${right - 7} ${foot - 3}L${right} ${foot}l-7 3`}
      />
      <path
        d={`M${side - 3} ${top + 7}L${side} ${top}l3 7M${side - 3} ${bottom - 7}L${side} ${bottom}l3 -7`}
      />
      <g stroke="none" className="figures fill-quiet">
        <text x={round(left + width / 2)} y={foot + 18} textAnchor="middle">
          {`${widthMm.toFixed(1)} mm`}
        </text>
        <text x={round(left + width / 2)} y={foot + 31} textAnchor="middle">
          {`${widthHp} HP`}
        </text>
        <text transform={`translate(${side - 8} ${middle}) rotate(-90)`} textAnchor="middle">
          {`${PANEL_HEIGHT_MM_3U} mm`}
        </text>
      </g>
    </g>
  )
}
