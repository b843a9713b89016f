import { z } from 'zod'
import { finishDays } from '@/lib/core/schedule/finish'
import { day, line, minorAmount, offerKind, optionalLine, tick, wholeNumber } from './fields'
import { amountIn, currencyCode, decimal, percent, unitPriceIn } from './plan-fields'
import { PRICE_BREAKS_WORDS, readBreaks } from './price-breaks'
import { blank, rows } from './rows'

const minutes = wholeNumber(0, 10_000, 'Enter whole minutes.')
const typed = z.string().max(30).optional()
const sum = z.preprocess((each) => (each === '' ? '0' : each), minorAmount())

/** A sum with a name in any currency: an amount that comes once, or is bound before the lock. */
const NamedSum = z
  .object({ name: line(80, 'Name it.'), amount: typed, currency: currencyCode })
  .transform(({ name, amount, currency }, check) => ({
    name,
    currency,
    amount: amountIn(currency, amount, 'amount', check),
  }))

const Board = z
  .object({
    name: line(80, 'Name it.'),
    kind: z.enum(['board', 'front_panel'], { error: 'Choose what it is.' }),
    perUnit: wholeNumber(1, 50),
    perArray: wholeNumber(1, 500),
    spare: wholeNumber(0, 1000),
    boards: tick,
    kit: tick,
    built: tick,
    supplier: line(120, 'Enter the supplier.'),
    currency: currencyCode,
    moq: wholeNumber(1, 1_000_000),
    multiple: wholeNumber(1, 1_000_000),
    setup: typed,
    stencil: typed,
    breaks: line(400, PRICE_BREAKS_WORDS.unreadable),
  })
  .transform(({ boards, kit, built, breaks, setup, stencil, ...board }, check) => {
    const read = readBreaks(breaks, board.currency)
    if (!read.ok)
      check.addIssue({ code: 'custom', path: ['breaks'], message: PRICE_BREAKS_WORDS[read.reason] })
    const neededFor = Object.entries({ boards, kit, built }).flatMap(([offer, needs]) =>
      needs ? [offer] : [],
    )
    if (neededFor.length === 0)
      check.addIssue({ code: 'custom', path: ['boards'], message: 'Tick the offers that need it.' })
    return {
      ...board,
      neededFor,
      setup: amountIn(board.currency, setup, 'setup', check),
      stencil: amountIn(board.currency, stencil, 'stencil', check),
      breaks: read.ok ? read.value : [],
    }
  })

/** What the assembler asks; no supplier means nobody assembles for the workshop. */
const Assembly = z
  .object({
    supplier: optionalLine(120),
    currency: blank(currencyCode),
    setup: typed,
    perDistinctPart: typed,
    perStart: typed,
  })
  .transform((row, check) => {
    if (row.supplier === undefined) return null
    if (row.currency === undefined)
      check.addIssue({ code: 'custom', path: ['currency'], message: 'Enter the currency of the bill.' })
    const currency = row.currency ?? ''
    return {
      supplier: row.supplier,
      currency,
      setup: amountIn(currency, row.setup, 'setup', check),
      perDistinctPart: amountIn(currency, row.perDistinctPart, 'perDistinctPart', check),
      perStart: unitPriceIn(currency, row.perStart, 'perStart', check),
    }
  })

const Supplier = z
  .object({
    supplier: line(120, 'Enter the supplier.'),
    currency: currencyCode,
    freight: typed,
    duty: percent(),
    importTax: percent(),
    reclaimable: tick,
  })
  .transform((row, check) => ({ ...row, freight: amountIn(row.currency, row.freight, 'freight', check) }))

const Rate = z.object({
  currency: currencyCode,
  rate: decimal('Enter the rate, such as 0.92.').refine(
    (rate) => Number(rate) > 0,
    'Enter a rate above zero.',
  ),
  on: day('Enter the day of the rate.'),
  margin: percent(),
})

const OfferWork = z.object({
  offer: offerKind,
  isAssembled: tick,
  minutesPerUnit: minutes,
  minutesPerStart: minutes,
  packaging: typed,
})

const OFFERS = ['boards', 'kit', 'built'] as const
const days = wholeNumber(0, 1000, 'Enter whole working days, from 0 to 1000.')
/** A step of the schedule; `after` names rows of the list by their numbers. */
const Step = z
  .object({
    id: z.string(),
    name: line(80, 'Name the step.'),
    optimistic: days,
    likely: days,
    pessimistic: days,
    after: z
      .string()
      .default('')
      .transform((list) => list.split(/[\s,;]+/).filter((each) => each !== '')),
    boards: tick,
    kit: tick,
    built: tick,
    closedFrom: blank(day()),
    closedTo: blank(day()),
  })
  .superRefine(({ optimistic, likely, pessimistic }, check) => {
    if (likely < optimistic)
      check.addIssue({ code: 'custom', path: ['likely'], message: 'Not before the soonest.' })
    if (pessimistic < likely)
      check.addIssue({ code: 'custom', path: ['pessimistic'], message: 'Not before the likely one.' })
  })
  .superRefine(({ closedFrom, closedTo }, check) => {
    const at = (path: string, message: string) => check.addIssue({ code: 'custom', path: [path], message })
    if (closedFrom && !closedTo) at('closedTo', 'Enter the last closed day as well.')
    if (!closedFrom && closedTo) at('closedFrom', 'Enter the first closed day as well.')
    if (closedFrom && closedTo && closedTo < closedFrom) at('closedTo', 'Not before the first closed day.')
  })
  .transform(({ boards, kit, built, closedFrom, closedTo, ...step }) => ({
    ...step,
    offers: OFFERS.filter((offer) => ({ boards, kit, built })[offer]),
    closedFrom: closedFrom ?? null,
    closedTo: closedTo ?? null,
  }))

/** Rows carry the number they are shown with, so that others can name them. */
const numbered = (list: unknown) =>
  Array.isArray(list)
    ? list.map((row: unknown, i) =>
        typeof row === 'object' && row !== null ? { ...row, id: String(i + 1) } : row,
      )
    : list

/**
 * The short cost plan of a module and its schedule. `currency` is the workshop's, and the currency of every sum that has
 * none beside it.
 */
export const PlanInput = z
  .object({
    currency: currencyCode,
    offers: z.array(OfferWork, { error: 'Enter the work per offer.' }).max(3),
    labourPerHourMinor: sum,
    onceMinutes: minutes,
    yieldPercent: percent('100').refine((share) => share > 0, 'Enter a yield above 0 %.'),
    confidencePercent: percent('95').refine(
      (share) => share > 0 && share < 10_000,
      'Enter more than 0 and less than 100 %.',
    ),
    unitsPerOrder: decimal('Enter the average units of one order, such as 1.1.').refine(
      (average) => Number(average) >= 1 && Number(average) <= 10,
      'Enter an average from 1 to 10.',
    ),
    postageChargedMinor: sum,
    postagePaidMinor: sum,
    fee: percent(),
    feeFixedMinor: sum,
    foreignFee: percent(),
    foreignShare: percent(),
    refundShare: percent(),
    disputeShare: percent(),
    disputeFixedMinor: sum,
    canLayOutMinor: blank(minorAmount()),
    laterUnits: z.preprocess(
      (each) => (each === '' || each === undefined ? 0 : each),
      wholeNumber(0, 10_000),
    ),
    failurePercent: percent('2'),
    taxes: rows(z.object({ rate: percent(), weight: wholeNumber(0, 1000) }), 6),
    oneOff: rows(NamedSum, 20, ['currency']),
    atRisk: rows(NamedSum, 10, ['currency']),
    boards: rows(Board, 8, ['kind', 'currency', 'perUnit', 'perArray', 'spare', 'moq', 'multiple']),
    assembly: z.preprocess((row) => row ?? {}, Assembly),
    suppliers: rows(Supplier, 12, ['currency']),
    rates: rows(Rate, 8),
    steps: z.preprocess(numbered, rows(Step, 30, ['id'])),
  })
  .superRefine((plan, check) => {
    const { steps, rates, suppliers } = plan
    const at = (path: (string | number)[], message: string) =>
      check.addIssue({ code: 'custom', path, message })
    const twice = (list: readonly string[]) => list.findIndex((each, i) => list.indexOf(each) !== i)
    const rate = twice(rates.map(({ currency }) => currency))
    if (rate >= 0) at(['rates', rate, 'currency'], 'This currency stands here twice.')
    const supplier = twice(suppliers.map((row) => row.supplier))
    if (supplier >= 0) at(['suppliers', supplier, 'supplier'], 'This supplier stands here twice.')
    for (const { path, currency } of currenciesOf(plan))
      if (currency !== plan.currency && !rates.some((each) => each.currency === currency))
        at(path, `There is no exchange rate for ${currency}. Enter one under “Exchange rates”.`)
    const unknown = steps.find(({ after }) => after.some((id) => !steps.some((step) => step.id === id)))
    if (unknown)
      return at(['steps', Number(unknown.id) - 1, 'after'], 'Name steps by the number of their row.')
    const areInOrder = steps.every(
      (step) => step.optimistic <= step.likely && step.likely <= step.pessimistic,
    )
    if (areInOrder && !finishDays(steps).ok)
      at(['steps', 0, 'after'], 'These steps wait for one another in a circle.')
  })
export type PlanInput = z.infer<typeof PlanInput>

type Priced = Pick<PlanInput, 'oneOff' | 'atRisk' | 'boards' | 'assembly' | 'suppliers'>

/** Every currency a plan is entered in, with the place it stands at. */
function currenciesOf(plan: Priced): { path: (string | number)[]; currency: string }[] {
  const lists = ['oneOff', 'atRisk', 'boards', 'suppliers'] as const
  const rowsOf = lists.flatMap((list) =>
    // A row that could not be read is undefined here; its own sentence stands at it.
    plan[list].flatMap((row: { currency: string } | undefined, i) =>
      row ? [{ path: [list, i, 'currency'], currency: row.currency }] : [],
    ),
  )
  const assembly = plan.assembly?.currency
  return assembly ? [...rowsOf, { path: ['assembly', 'currency'], currency: assembly }] : rowsOf
}
