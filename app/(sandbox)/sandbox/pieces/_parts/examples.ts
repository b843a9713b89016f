import { minor } from '@/lib/core/brand'
import type { Curve } from '@/lib/core/costs/curve'
import type { FrontPanelControl } from '@/components/charts/front-panel-drawing'
import type { RunStep } from '@/components/charts/run-line'

const jacks = (['Clock', 'Reset', 'Out 1', 'Out 2', 'Out 3', 'Out 4'] as const).map(
  (label, index): FrontPanelControl => ({
    kind: 'jack',
    label,
    xMm: 12.3 + (index % 3) * 18,
    yMm: index < 3 ? 92 : 110,
    sizeMm: 8,
  }),
)

export const controls: FrontPanelControl[] = [
  { kind: 'display', label: '', xMm: 30.3, yMm: 18, sizeMm: 26 },
  { kind: 'knob', label: 'Swing', xMm: 30.3, yMm: 38, sizeMm: 16 },
  { kind: 'knob', label: 'Div 1', xMm: 14, yMm: 58, sizeMm: 11 },
  { kind: 'knob', label: 'Div 2', xMm: 46.6, yMm: 58, sizeMm: 11 },
  { kind: 'slider', label: 'Mix', xMm: 30.3, yMm: 64, sizeMm: 22 },
  { kind: 'switch', label: 'Mode', xMm: 14, yMm: 76, sizeMm: 6 },
  { kind: 'button', label: 'Tap', xMm: 46.6, yMm: 76, sizeMm: 6 },
  { kind: 'light', label: '', xMm: 54, yMm: 76, sizeMm: 3 },
  ...jacks,
]

export const steps: RunStep[] = [
  { key: 'deposits', name: 'Deposits', from: '2027-03-01', to: '2027-04-18', state: 'done' },
  { key: 'parts', name: 'Order parts', from: '2027-04-19', to: '2027-04-23', state: 'done' },
  { key: 'boards', name: 'Boards and front panels', from: '2027-04-24', to: '2027-06-04', state: 'now' },
  { key: 'assembly', name: 'Assembly', from: '2027-06-05', to: '2027-07-20', state: 'to_come' },
  { key: 'test', name: 'Test', from: '2027-07-21', to: '2027-08-10', state: 'to_come' },
  { key: 'packing', name: 'Packing', from: '2027-08-11', to: '2027-08-20', state: 'to_come' },
]

/** A made-up cost with a set-up and a jump, so that the steps can be seen. */
export const curve = (upTo: number): Curve =>
  Array.from({ length: upTo }, (_, index) => {
    const units = index + 1
    const revenue = units * 9_500
    const cost = 380_000 + (units > 50 ? 120_000 : 0) + Math.ceil(units / 10) * 9_000
    return {
      revenue: minor(revenue),
      cost: minor(cost),
      profit: minor(revenue - cost),
      unitCost: minor(Math.round(cost / units)),
    }
  })
