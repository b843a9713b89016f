import { render, screen, within } from '@testing-library/react'
import { expect, test } from 'vitest'
import { FillGauge } from '@/components/charts/fill-gauge'
import { FrontPanelDrawing } from '@/components/charts/front-panel-drawing'
import { RunLine } from '@/components/charts/run-line'
import { StepChart } from '@/components/charts/step-chart'

const levels = { minimum: 60, maximum: 100, daysLeft: 17 }

test('the gauge says in a sentence what it draws', () => {
  render(<FillGauge deposited={41} {...levels} />)
  expect(screen.getByText('41 of 60 under deposit; 17 days left.')).toBeVisible()
})

test.each([
  [64, 17, '64 under deposit, past the minimum of 60; 36 places to the maximum; 17 days left.'],
  [99, 1, '99 under deposit, past the minimum of 60; one place to the maximum; 1 day left.'],
  [100, 0, 'All 100 places are under deposit; the last day has passed.'],
  [0, 17, '0 of 60 under deposit; 17 days left.'],
])('%i under deposit with %i days left', (deposited, daysLeft, sentence) => {
  render(<FillGauge size="small" deposited={deposited} {...levels} daysLeft={daysLeft} />)
  expect(screen.getByText(sentence)).toBeVisible()
})

test('without a forecast nothing of one is drawn, said or tabled', () => {
  const { container } = render(<FillGauge size="large" deposited={41} {...levels} />)
  expect(container).not.toHaveTextContent(/expected|range/i)
  expect(container.querySelectorAll('svg .stroke-tide')).toHaveLength(0)
})

test('the owner’s gauge has forecast and range, drawn, said and tabled', () => {
  const { container } = render(
    <FillGauge size="large" deposited={41} {...levels} forecast={{ mean: 66.2, low: 57, high: 76 }} />,
  )
  expect(screen.getByText('Expected in the end: 66; in 8 of 10 cases between 57 and 76.')).toBeVisible()
  expect(container.querySelectorAll('svg .stroke-tide').length).toBeGreaterThan(0)
  const value = (name: string) => screen.getByText(name, { selector: 'dt' }).nextElementSibling?.textContent
  expect(value('Under deposit')).toBe('41')
  expect(value('Expected from confirmed sign-ups')).toBe('25')
  expect(value('80 % range')).toBe('57 to 76')
})

test('the fill is as high as its share of the scale', () => {
  const { container } = render(<FillGauge size="large" deposited={50} {...levels} />)
  const fill = container.querySelector('rect.fill-tide')!
  // Large: floor at 276, top at 20; half of 100 is half of 256.
  expect(Number(fill.getAttribute('height'))).toBeCloseTo(128, 5)
})

const controls = [
  { kind: 'knob' as const, label: 'Swing', xMm: 30, yMm: 40, sizeMm: 16 },
  { kind: 'jack' as const, label: 'Out', xMm: 15, yMm: 100, sizeMm: 8 },
  { kind: 'jack' as const, label: 'In', xMm: 45, yMm: 100, sizeMm: 8 },
]

test('the front panel is an image with a name, to scale, with a table', () => {
  const { container } = render(<FrontPanelDrawing name="Rowlock" widthHp={12} controls={controls} />)
  // 12 HP are made 60.6 mm wide, 3 U 128.5 mm high (common practice, no source).
  expect(screen.getByRole('img')).toHaveAccessibleName(
    'Rowlock. Front panel, 12 HP wide: 60.6 by 128.5 mm, with 1 knob and 2 jacks.',
  )
  const outline = container.querySelector('svg rect')!
  const ratio = Number(outline.getAttribute('width')) / Number(outline.getAttribute('height'))
  expect(ratio).toBeCloseTo(60.6 / 128.5, 3)
  expect(screen.getByText('60.6 mm')).toBeInTheDocument()
  expect(screen.getByText('12 HP')).toBeInTheDocument()
  expect(within(screen.getByRole('table')).getAllByRole('row')).toHaveLength(4)
})

test('a very wide front panel keeps its proportions and its place', () => {
  const { container } = render(<FrontPanelDrawing name="Wide" widthHp={84} controls={[]} />)
  expect(Number(container.querySelector('svg')!.getAttribute('width'))).toBeLessThanOrEqual(640)
  expect(screen.getByText('No controls have been entered yet.')).toBeInTheDocument()
})

const steps = [
  { key: 'a', name: 'Boards', from: '2027-03-01', to: '2027-03-31', state: 'now' as const },
  { key: 'b', name: 'Packing', from: '2027-04-01', to: '2027-04-10', state: 'to_come' as const },
]

test('the run line says what is under way and what is promised', () => {
  render(<RunLine steps={steps} today="2027-03-05" postedBy="2027-04-30" chance={0.83} />)
  expect(screen.getByText('Now: Boards. Posted by 30 April 2027, 83 % likely.')).toBeVisible()
  expect(screen.getByRole('rowheader', { name: 'Packing' })).toBeInTheDocument()
  expect(screen.getAllByText('today').length).toBeGreaterThan(0)
})

test('no steps is said, not drawn', () => {
  const { container } = render(<RunLine steps={[]} today="2027-03-05" />)
  expect(container).toHaveTextContent('No steps have been entered yet.')
  expect(container.querySelector('svg')).toBeNull()
})

const run = { currency: 'EUR', minimum: 3, maximum: 5, deposited: 2 }

test('the step chart says where it loses and that it loses again', () => {
  render(
    <StepChart
      {...run}
      profits={[-1000, 500, -200, 300, 700]}
      breakEven={{ firstProfit: 2, safeFrom: 4, lossGaps: [[3, 3]] }}
      forecast={{ mean: 3.6, low: 3, high: 5 }}
    />,
  )
  expect(screen.getByText('At 2 units it leaves €5.00.')).toBeVisible()
  expect(
    screen.getByText(
      'From 2 units it no longer loses, but a price step makes it lose again at 3; from 4 it stays without loss.',
    ),
  ).toBeVisible()
  const row = screen.getByRole('rowheader', { name: 'forecast' }).closest('tr')!
  expect(
    within(row)
      .getAllByRole('cell')
      .map((cell) => cell.textContent),
  ).toEqual(['Units4', 'Profit€3.00'])
})

test('a run that never pays says so', () => {
  render(
    <StepChart {...run} profits={[-3, -2]} breakEven={{ firstProfit: null, safeFrom: null, lossGaps: [] }} />,
  )
  expect(screen.getByText('It loses at every quantity up to 2.')).toBeVisible()
})

test('without costs there is nothing to draw', () => {
  const { container } = render(
    <StepChart {...run} profits={[]} breakEven={{ firstProfit: null, safeFrom: null, lossGaps: [] }} />,
  )
  expect(container.querySelector('svg')).toBeNull()
})
