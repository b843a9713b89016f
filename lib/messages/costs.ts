import { formatMoney } from '@/lib/core/money/format'
import { plural } from './plural'
import { writtenDay, writtenNumber, writtenPercent } from './written'

const units = (count: number) => plural(count, { one: '# unit', other: '# units' })
const boards = (count: number) => plural(count, { one: '# board', other: '# boards' })
const share = (basisPoints: number) => writtenPercent(basisPoints / 10_000)

type Build = {
  need: number
  starts: number
  yieldBasisPoints: number
  confidenceBasisPoints: number
  spares: number
  failureBasisPoints: number
  extra: { quantity: number; laterUnits: number; missed: number; leftOver: number } | null
}

/** The page of a run's costs. */
export const costWords = {
  title: 'Costs',
  lead: 'Change a figure below and everything here follows at once. Nothing counts for the decision before you save.',
  noPlan:
    'There is no plan that knows every offer of this run. Fill in what you know below; a figure left empty counts nothing.',
  planOf: {
    run: 'This run’s own plan.',
    module: 'The module’s plan, at this run’s prices. Saving makes a plan of this run’s own.',
    none: 'A beginning from common practice. Change every figure.',
  },
  changedParts: (count: number) =>
    `${plural(count, { one: 'One line of the parts list is', other: '# lines of the parts list are' })} no longer as this plan has them. Save the plan to take the list over as it stands.`,
  changedPartsTitle: 'The parts list has changed',
  toParts: 'To the parts list',
  toPlan: 'To the module’s plan',

  units: 'Show it for so many units',
  unitsHint: 'Left empty: what is under deposit, at least the minimum.',
  show: 'Show',
  live: (count: number, profit: string, isLoss: boolean, safeFrom: number | null) =>
    `At ${units(count)}: ${isLoss ? `loses ${profit}` : `leaves ${profit}`}; ${safeFrom === null ? 'loses at the maximum' : `no loss from ${writtenNumber(safeFrom)}`}.`,
  unread: 'A figure cannot be read yet. What is shown is the last that could be.',
  unsaved: 'Not saved.',

  profit: 'Profit at every quantity',
  breakEven: 'No loss from, at today’s mix',
  minimum: 'Minimum of this run',
  never: (upTo: number) => `no quantity up to ${writtenNumber(upTo)}`,
  atUnits: (count: number) => units(count),
  minimumTitle: 'The minimum is not enough',
  tooLow: (minimum: number, even: number) =>
    `The minimum of ${writtenNumber(minimum)} lies below it: a run that just reaches its minimum loses money. It pays from ${writtenNumber(even)}.`,
  inGap: (minimum: number) =>
    `The minimum of ${writtenNumber(minimum)} lies in a stretch where a price step makes the run lose again. Look at the drawing.`,
  expected: 'Expected profit',
  chanceOfLoss: 'Chance of a loss',
  expectedHint: 'Over go and call-off together, on orders expected to be paid: deposits are not payments.',
  mixHint: 'Mix',

  oneUnit: 'One unit',
  oneUnitCaption: (count: number) => `An average unit of a run of ${writtenNumber(count)}`,
  line: 'What',
  perUnit: 'Per unit',
  wholeRun: 'Whole run',
  paid: 'The buyer pays, postage and tax included',
  tax: 'less sales tax',
  revenue: 'Comes in',
  cost: 'Costs',
  left: 'Left',
  addsUp: 'The lines add up to the last cent; the smallest share is rounded where it must be.',
  kinds: {
    one_off: 'Costs that come once',
    board: 'Boards',
    front_panel: 'Front panels',
    part: 'Parts',
    stencil: 'Stencils',
    assembly: 'Assembly by somebody else',
    freight: 'Freight',
    duty: 'Duty',
    import_tax: 'Import tax you keep bearing',
    labour: 'Paid work',
    packaging: 'Packaging',
    per_unit: 'Other costs per unit',
    postage: 'Postage',
    payment_fee: 'Card fees',
    refund_fee: 'Fees of orders paid back',
    dispute_fee: 'Disputes',
  },
  everyLine: 'Every line of the run',
  everyLineCaption: (count: number) => `Costs of a run of ${writtenNumber(count)}, line by line`,
  unpricedTitle: 'Not in the sum',
  unpriced: {
    no_quote: (name: string) => `${name}: nobody has quoted it.`,
    no_rate: (name: string) => `${name}: its currency has no exchange rate.`,
  },

  movers: 'What moves the result most',
  moversLead:
    'Each figure a tenth less and a tenth more than planned, the yield five points, everything else as it is.',
  moversCaption: 'Profit when one figure turns out differently',
  mover: 'Figure',
  less: 'If less',
  more: 'If more',
  moverKinds: {
    price: () => 'Your prices',
    quantity: () => 'Units sold',
    parts: () => 'Prices of parts',
    boards: () => 'Prices of boards and front panels',
    assembly: () => 'Price of assembly',
    labour: () => 'Pay per hour',
    yield: () => 'Yield (five points)',
    rate: (currency: string) => `Exchange rate of ${currency}`,
    fees: () => 'Card fees',
    postage: () => 'Postage you pay',
    packaging: () => 'Packaging',
    one_off: () => 'Costs that come once',
    freight: () => 'Freight',
  },
  noMovers: 'Nothing moves the result yet: fill in prices and costs.',

  cash: 'Money over time',
  cashAssumes: (boughtOn: string, balancesOn: string, postedOn: string) =>
    `Counted with bills on ${writtenDay(boughtOn)}, balances on ${writtenDay(balancesOn)} and the post on ${writtenDay(postedOn)}. Deposits are held until the lock.`,
  noLimit: 'Say below what you can lay out, and it stands in the drawing.',

  callOff: 'If the run is called off',
  callOffNow: 'Called off today it costs you',
  callOffMinimum: 'Called off with the minimum under deposit',
  callOffHint: 'What is spent or bound before the lock, and the fees of paying everybody back.',

  build: 'How many to build',
  starts: ({ need, starts, yieldBasisPoints, confidenceBasisPoints }: Build) =>
    need === 0
      ? 'Nothing is assembled, so nothing has to be put into work beyond what is sold.'
      : `Put ${boards(starts)} into work for ${writtenNumber(need)} assembled units: at ${share(yieldBasisPoints)} good, enough come out in ${share(confidenceBasisPoints)} of such runs.`,
  spares: ({ spares, failureBasisPoints }: Build) =>
    failureBasisPoints === 0
      ? 'No spares: you expect none to come back.'
      : `Keep ${units(spares)} as spares: with ${share(failureBasisPoints)} coming back, they last in 95 of 100 cases.`,
  extra({ extra }: Build, currency: string, locale: string): string {
    if (!extra) return 'Nothing for stock: say below how many may be wanted after the run.'
    const sum = (minor: number) => formatMoney(minor, currency, locale)
    if (extra.missed <= 0)
      return `Nothing for stock: one more unit costs ${sum(extra.leftOver)} to make and brings less.`
    return `Build ${units(extra.quantity)} more for stock: one left over costs ${sum(extra.leftOver)}, one missing ${sum(extra.missed)} of profit, and some ${writtenNumber(extra.laterUnits)} may be wanted.`
  },

  rates: 'Exchange rates in this plan',
  rate: 'Rate',
  on: 'Taken on',
  margin: 'Margin',
  currency: 'Currency',
  noRates: 'Everything is bought in your own currency.',
  age: (days: number) => plural(days, { one: '# day old', other: '# days old' }),
} as const
