import { readDecimal, timesFraction } from '@/lib/core/costs/decimal'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { CostLedger } from '@/lib/core/costs/run-line'
import type { OfferColumns } from '@/lib/core/costs/run-split'
import { wholeFrom } from '@/lib/core/stats/argument'

/**
 * Prepares what comes with every unit and order: paid work, packaging, other sums per unit, postage.
 * Rounding: half-up once per line.
 */
export function workAndPacking(
  plan: CostPlan,
  ledger: CostLedger,
): (run: number, offers: readonly OfferColumns[], orders: number) => void {
  const payFor = timesFraction(BigInt(wholeFrom(0, 'costRun: labour.perHour', plan.labour.perHour)), 60n)
  const onceMinutes = wholeFrom(0, 'costRun: labour.onceMinutes', plan.labour.onceMinutes)
  const postage = wholeFrom(0, 'costRun: orders.postagePaid', plan.orders.postagePaid)
  const works = plan.offers.map(({ offer, minutesPerUnit, minutesPerStart, packaging }) => {
    wholeFrom(0, `costRun: ${offer}.minutesPerUnit`, minutesPerUnit)
    wholeFrom(0, `costRun: ${offer}.minutesPerStart`, minutesPerStart)
    return { offer, minutesPerUnit, minutesPerStart, packagingOf: timesDecimal('packaging', packaging) }
  })
  const others = plan.perUnit.map(({ name, offer, amount }) => {
    const at = plan.offers.findIndex((each) => each.offer === offer)
    if (at < 0) throw new RangeError(`costRun: perUnit must name offers of the plan, got ${offer}`)
    return { name, at, costOf: timesDecimal(name, amount) }
  })
  return (run, offers, orders) => {
    ledger(run, 'labour', 'once', payFor(onceMinutes))
    works.forEach(({ offer, minutesPerUnit, minutesPerStart, packagingOf }, i) => {
      const { units, starts } = offers[i]!
      ledger(run, 'labour', offer, payFor(units[run]! * minutesPerUnit + starts[run]! * minutesPerStart))
      ledger(run, 'packaging', offer, packagingOf(units[run]!))
    })
    for (const { name, at, costOf } of others) ledger(run, 'per_unit', name, costOf(offers[at]!.units[run]!))
    ledger(run, 'postage', 'orders', orders * postage)
  }
}

function timesDecimal(name: string, text: string): (units: number) => number {
  const price = readDecimal(`costRun: ${name}`, text)
  return timesFraction(price.digits, price.scale)
}
