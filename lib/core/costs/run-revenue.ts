import { readDecimal, timesFraction } from '@/lib/core/costs/decimal'
import type { CostPlan } from '@/lib/core/costs/plan'
import { splitter, type OfferColumns } from '@/lib/core/costs/run-split'
import { allocate } from '@/lib/core/money/allocate'
import { wholeFrom } from '@/lib/core/stats/argument'

/** What buyers pay for a run of one size, and how much of it is the maker's. Minor units of the selling currency. */
export type Takings = {
  readonly orders: number
  /** Everything buyers pay, tax and postage included; and the part of it that comes as deposits. */
  readonly paid: number
  readonly deposits: number
  /** `paid` less the sales tax in it. */
  readonly revenue: number
}

/**
 * Prepares what buyers pay and what of it stays.
 * Rounding: tax half-up once per offer and rate, and once per rate for postage; orders up to a whole order.
 */
export function takings(plan: CostPlan): (offers: readonly OfferColumns[], run: number) => Takings {
  const { postageCharged } = plan.orders
  wholeFrom(0, 'costRun: orders.postageCharged', postageCharged)
  for (const { price, deposit } of plan.offers) {
    wholeFrom(0, 'costRun: price', price)
    wholeFrom(0, 'costRun: deposit', deposit)
  }
  const surcharges = plan.offers.map(({ offer }) =>
    plan.choices
      .filter((choice) => choice.offer === offer)
      .flatMap(({ answers }) =>
        answers.filter(({ surcharge }) => wholeFrom(0, 'costRun: surcharge', surcharge) > 0),
      ),
  )
  const ordersOf = orderCount(plan)
  const taxOf = taxSplit(plan)
  return (offers, run) => {
    const units = offers.reduce((sum, offer) => sum + offer.units[run]!, 0)
    const orders = ordersOf(units)
    const postage = orders * postageCharged
    let paid = postage
    let deposits = 0
    let tax = taxOf(0, postage, units)
    plan.offers.forEach(({ price, deposit }, i) => {
      const at = offers[i]!
      let extra = 0
      for (const { id, surcharge } of surcharges[i]!) extra += surcharge * at.unitsByAnswer.get(id)![run]!
      tax += taxOf(price, extra, at.units[run]!)
      paid += at.units[run]! * price + extra
      deposits += at.units[run]! * deposit
    })
    return plan.tax.pricesIncludeTax
      ? { orders, paid, deposits, revenue: paid - tax }
      : { orders, paid: paid + tax, deposits, revenue: paid }
  }
}

/** Prepares the number of orders that some units come in: units ÷ average, rounded up. */
export function orderCount(plan: CostPlan): (units: number) => number {
  const average = readDecimal('costRun: orders.unitsPerOrder', plan.orders.unitsPerOrder)
  if (average.digits < average.scale) {
    throw new RangeError(`costRun: orders.unitsPerOrder must be at least 1, got ${plan.orders.unitsPerOrder}`)
  }
  if (average.digits === average.scale) return (units) => units
  return (units) => Number((BigInt(units) * average.scale + average.digits - 1n) / average.digits)
}

/** The tax in (or on) units at a price and a further sum earned with them, each rate on its share of the units. */
function taxSplit({ tax }: CostPlan): (price: number, extra: number, units: number) => number {
  const isTaxed = tax.mode === 'home_rate' || tax.mode === 'destination_rate'
  if (!isTaxed || !tax.rates.some(({ weight }) => weight > 0)) return () => 0
  const splitUnits = splitter(tax.rates.map(({ weight }) => weight))
  const parts = tax.rates.map(({ basisPoints }) => {
    const share = BigInt(wholeFrom(0, 'costRun: tax.rates.basisPoints', basisPoints))
    return timesFraction(share, tax.pricesIncludeTax ? 10_000n + share : 10_000n)
  })
  return (price, extra, units) => {
    if (units === 0) return 0
    const shares = splitUnits(units)
    const extras = extra === 0 ? null : allocate(extra, shares)
    let due = 0
    for (let i = 0; i < parts.length; i++)
      due += parts[i]!(shares[i]! * price + (extras?.ok ? extras.value[i]! : 0))
    return due
  }
}
