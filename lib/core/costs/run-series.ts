import { exchange } from '@/lib/core/costs/exchange'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { Chosen } from '@/lib/core/costs/quote-choice'
import { assemblyBills } from '@/lib/core/costs/run-assembly'
import { buyingsOf, type Buying } from '@/lib/core/costs/run-buying'
import { paymentFees } from '@/lib/core/costs/run-fees'
import type { CostLedger, LineKind, Unpriced } from '@/lib/core/costs/run-line'
import { takings, type Takings } from '@/lib/core/costs/run-revenue'
import { offerColumns } from '@/lib/core/costs/run-split'
import { supplierCosts, type Goods } from '@/lib/core/costs/run-suppliers'
import { workAndPacking } from '@/lib/core/costs/run-work'
import { wholeFrom } from '@/lib/core/stats/argument'

/** What else may be asked of a series: its cost lines (none of 0), what is bought, and what has no price. */
export type SeriesDetails = {
  readonly line: (kind: LineKind, name: string, amount: number) => void
  readonly bought: (buying: Buying, chosen: Chosen, counts: BoughtCounts) => void
  readonly unpriced: (found: Unpriced) => void
}

/** How many pieces a run needs, with attrition, and what a purchase leaves over. */
export type BoughtCounts = { readonly needed: number; readonly wanted: number; readonly leftover: number }

/** The money of one run, in minor units of the selling currency, and its assembled units put into work. */
export type RunSums = Takings & { readonly starts: number; readonly cost: number }

/**
 * Costs a series of runs of one plan: one thing to buy after the other through all runs, which is what makes a curve
 * of a thousand quantities quick.
 * Units:  runs[k][i] units of the plan's i-th offer in the k-th run.
 * Domain: a plan whose numbers are as CostPlan says → otherwise RangeError naming the field.
 * Cost:   parts × quotes × breaks once; then linear in parts × runs.
 */
export function runSeries(
  plan: CostPlan,
  runs: readonly (readonly number[])[],
  details?: SeriesDetails,
): readonly RunSums[] {
  const costs = new Float64Array(runs.length)
  const ledger: CostLedger = (run, kind, name, amount) => {
    costs[run]! += amount
    if (amount !== 0) details?.line(kind, name, amount)
  }
  const report = details?.unpriced ?? (() => {})
  const offers = offerColumns(plan, runs)
  for (const { name, amount, currency } of plan.oneOff) {
    const cost = exchange(currency, plan.currency, plan.rates)?.(wholeFrom(0, `costRun: ${name}`, amount))
    if (cost === undefined) report({ kind: 'one_off', name, reason: 'no_rate' })
    else for (let k = 0; k < runs.length; k++) ledger(k, 'one_off', name, cost)
  }
  const goods: Goods[] = runs.map(() => new Float64Array(plan.suppliers.length).fill(-1))
  const addGoods = (run: number, supplierAt: number, amount: number) => {
    if (supplierAt >= 0) goods[run]![supplierAt] = Math.max(0, goods[run]![supplierAt]!) + amount
  }
  const needs = new Float64Array(runs.length)
  for (const buying of buyingsOf(plan)) {
    buying.fillNeeds(offers, needs)
    for (let k = 0; k < runs.length; k++) {
      const wanted = buying.wanted(needs[k]!)
      const missing = buying.missing(wanted)
      if (missing === 0) continue
      if (buying.choose === null) {
        report({ kind: buying.kind, name: buying.name, reason: buying.unpriced! })
        continue
      }
      const chosen = buying.choose(missing)
      const stencil = buying.stencil === 0 ? 0 : chosen.from.convert(buying.stencil)
      costs[k]! += chosen.amount + stencil
      addGoods(k, chosen.from.supplierAt, chosen.amount + stencil)
      if (details === undefined) continue
      if (chosen.amount > 0) details.line(buying.kind, buying.name, chosen.amount)
      if (stencil > 0) details.line('stencil', buying.name, stencil)
      details.bought(buying, chosen, { needed: needs[k]!, wanted, leftover: chosen.quantity - missing })
    }
  }
  const assembler = plan.assembly?.supplier ?? ''
  const assemblerAt = plan.suppliers.findIndex(({ supplier }) => supplier === assembler)
  const bills = assemblyBills(plan, offers, runs.length)
  if (bills === 'unpriced') report({ kind: 'assembly', name: assembler, reason: 'no_rate' })
  const landed = supplierCosts(plan, ledger, report)
  const takingsOf = takings(plan)
  const work = workAndPacking(plan, ledger)
  const fees = paymentFees(plan, ledger)
  return runs.map((_, k) => {
    const bill = bills === 'unpriced' ? 0 : bills[k]!
    if (bill > 0) {
      ledger(k, 'assembly', assembler, bill)
      addGoods(k, assemblerAt, bill)
    }
    landed(k, goods[k]!)
    const taken = takingsOf(offers, k)
    work(k, offers, taken.orders)
    fees(k, taken)
    return { ...taken, starts: offers.reduce((sum, { starts }) => sum + starts[k]!, 0), cost: costs[k]! }
  })
}

/**
 * Counts by offer in the order of the plan; an offer left out counts 0.
 * Domain: whole counts ≥ 0 of offers of the plan → otherwise RangeError.
 */
export function inPlanOrder(
  plan: CostPlan,
  name: string,
  counts: Readonly<Record<string, number>>,
): number[] {
  for (const [offer, count] of Object.entries(counts)) {
    wholeFrom(0, `${name}.${offer}`, count)
    if (!plan.offers.some((each) => each.offer === offer)) {
      throw new RangeError(`${name} must name offers of the plan, got ${offer}`)
    }
  }
  return plan.offers.map(({ offer }) => counts[offer] ?? 0)
}
