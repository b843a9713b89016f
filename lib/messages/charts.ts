import { plural } from './plural'
import { writtenDay, writtenNumber, writtenPercent } from './written'

const units = (count: number) => plural(count, { one: '# unit', other: '# units' })
const days = (count: number) => plural(count, { one: '# day', other: '# days' })
/** "a, b and c" */
const listed = (words: readonly string[]) =>
  new Intl.ListFormat('en-GB', { style: 'long', type: 'conjunction' }).format(words)

type GaugeFacts = {
  deposited: number
  minimum: number
  maximum: number
  daysLeft?: number
  decideBy?: string
}

/** The sentences of the drawn pieces: each says in words what its drawing shows. */
export const charts = {
  gauge({ deposited, minimum, maximum, daysLeft, decideBy }: GaugeFacts): string {
    const by = decideBy ? `, until ${writtenDay(decideBy)}` : ''
    const left =
      daysLeft === undefined
        ? ''
        : daysLeft > 0
          ? `; ${days(daysLeft)} left${by}`
          : `; the last day has passed`
    if (deposited >= maximum) return `All ${writtenNumber(maximum)} places are under deposit${left}.`
    if (deposited >= minimum)
      return `${writtenNumber(deposited)} under deposit, past the minimum of ${writtenNumber(minimum)}; ${plural(maximum - deposited, { one: 'one place', other: '# places' })} to the maximum${left}.`
    return `${writtenNumber(deposited)} of ${writtenNumber(minimum)} under deposit${left}.`
  },
  gaugeForecast: ({ mean, low, high }: { mean: number; low: number; high: number }) =>
    `Expected in the end: ${writtenNumber(Math.round(mean))}; in 8 of 10 cases between ${writtenNumber(low)} and ${writtenNumber(high)}.`,
  underDeposit: 'Under deposit',
  expected: 'Expected from confirmed sign-ups',
  range80: '80 % range',
  rangeWords: (low: number, high: number) => `${writtenNumber(low)} to ${writtenNumber(high)}`,
  minimum: 'Minimum',
  maximum: 'Maximum',
  minimumAt: (count: number) => `minimum ${writtenNumber(count)}`,
  maximumAt: (count: number) => `maximum ${writtenNumber(count)}`,
  daysLeft: 'Days left',

  frontPanel: (hp: number, widthMm: number, heightMm: number, controls: readonly string[]) =>
    `Front panel, ${hp} HP wide: ${widthMm.toFixed(1)} by ${heightMm} mm${controls.length > 0 ? `, with ${listed(controls)}` : ''}.`,
  controls: {
    knob: (count: number) => plural(count, { one: '# knob', other: '# knobs' }),
    jack: (count: number) => plural(count, { one: '# jack', other: '# jacks' }),
    switch: (count: number) => plural(count, { one: '# switch', other: '# switches' }),
    button: (count: number) => plural(count, { one: '# button', other: '# buttons' }),
    light: (count: number) => plural(count, { one: '# light', other: '# lights' }),
    slider: (count: number) => plural(count, { one: '# slider', other: '# sliders' }),
    display: (count: number) => plural(count, { one: '# display', other: '# displays' }),
  },
  controlKind: {
    knob: 'knob',
    jack: 'jack',
    switch: 'switch',
    button: 'button',
    light: 'light',
    slider: 'slider',
    display: 'display',
  },
  control: 'Control',
  kind: 'Kind',
  fromLeft: 'mm from left',
  fromTop: 'mm from top',
  controlsCaption: 'What sits on the front panel and where',
  noControls: 'No controls have been entered yet.',

  today: 'today',
  postedBy: 'posted by',
  promised: 'Posted by',
  chance: (ratio: number) => `${writtenPercent(ratio)} likely`,
  step: 'Step',
  from: 'From',
  to: 'To',
  howFar: 'How far',
  runLineCaption: 'The steps of the run with their dates',
  noSteps: 'No steps have been entered yet.',
  runLine(now: readonly string[], postedBy: string | undefined, chance: number | undefined): string {
    const doing = now.length > 0 ? `Now: ${listed(now)}.` : 'No step is under way today.'
    const by = postedBy
      ? ` Posted by ${writtenDay(postedBy)}${chance === undefined ? '' : `, ${writtenPercent(chance)} likely`}.`
      : ''
    return `${doing}${by}`
  },

  profitAt: (quantity: number, sum: string, isLoss: boolean) =>
    isLoss ? `At ${units(quantity)} the run loses ${sum}.` : `At ${units(quantity)} it leaves ${sum}.`,
  neverProfit: (upTo: number) => `It loses at every quantity up to ${writtenNumber(upTo)}.`,
  profitFrom: (first: number, safe: number | null, gaps: readonly (readonly [number, number])[]) => {
    const again = gaps
      .filter(([from]) => from > first)
      .map(([from, to]) => (from === to ? `at ${from}` : `from ${from} to ${to}`))
    const start = first <= 1 ? 'It loses at no quantity' : `From ${units(first)} it no longer loses`
    if (again.length === 0) return `${start}.`
    return `${start}, but a price step makes it lose again ${listed(again)}${safe === null ? '' : `; from ${writtenNumber(safe)} it stays without loss`}.`
  },
  quantity: 'Units',
  profit: 'Profit',
  point: 'Where',
  depositsNow: 'deposits now',
  forecast: 'forecast',
  forecastLow: 'forecast, low end of the 80 % range',
  forecastHigh: 'forecast, high end of the 80 % range',
  breakEven: 'break-even',
  stepChartCaption: 'Profit at the quantities that matter',
  noCurve: 'Profit cannot be drawn before the costs are known.',
  noBalance: 'No money moves yet: fill in prices and costs.',
  balanceLow: (sum: string, day: string) =>
    `At its lowest, on ${writtenDay(day)}, the run has taken ${sum} of your own money.`,
  balanceNeverLow: 'The run never takes money of your own: deposits and balances come before the bills.',
  balanceBeyond: (over: string, limit: string) => `That is ${over} more than the ${limit} you can lay out.`,
  balanceWithin: (limit: string) => `That is within the ${limit} you can lay out.`,
  balanceCaption: 'Money in the bank at the end of each day that moves some',
  balance: 'In the bank',
  day: 'Day',
  limit: 'what you can lay out',
  lowest: 'lowest',
  axisUnits: 'units',
  loss: 'loss',
}
