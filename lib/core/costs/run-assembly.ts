import { readDecimal } from '@/lib/core/costs/decimal'
import { exchange } from '@/lib/core/costs/exchange'
import type { CostPlan } from '@/lib/core/costs/plan'
import { columnOf } from '@/lib/core/costs/run-buying'
import type { Column, OfferColumns } from '@/lib/core/costs/run-split'
import { roundHalfUp } from '@/lib/core/money/round'
import { wholeFrom } from '@/lib/core/stats/argument'

/**
 * The assembler's bill of each run in the selling currency, 0 where nothing is placed; 'unpriced' without a rate.
 * Joints are counted on units put into work; losses of parts are not joints.
 * Rounding: exactly in the assembler's currency, half-up once, then exchanged.
 */
export function assemblyBills(
  plan: CostPlan,
  offers: readonly OfferColumns[],
  runs: number,
): Column | 'unpriced' {
  const { assembly } = plan
  const bills = new Float64Array(runs)
  if (assembly === null) return bills
  const setup = wholeFrom(0, 'costRun: assembly.setup', assembly.setup)
  const perDistinct = wholeFrom(0, 'costRun: assembly.perDistinctPart', assembly.perDistinctPart)
  const prices = [assembly.perJoint, assembly.perHandJoint, assembly.perStart].map((text) =>
    readDecimal('costRun: assembly price', text),
  )
  const scale = prices.reduce((most, price) => (price.scale > most ? price.scale : most), 1n)
  const [joint, handJoint, perStart] = prices.map((price) => price.digits * (scale / price.scale))
  const { distinct, byMachine, byHand, starts } = placedByAssembler(plan, offers, runs)
  const convert = exchange(assembly.currency, plan.currency, plan.rates)
  for (let k = 0; k < runs; k++) {
    if (distinct[k] === 0) continue
    if (convert === null) return 'unpriced'
    const exact =
      BigInt(byMachine[k]!) * joint! + BigInt(byHand[k]!) * handJoint! + BigInt(starts[k]!) * perStart!
    bills[k] = convert(setup + perDistinct * distinct[k]! + roundHalfUp(exact, scale))
  }
  return bills
}

/** What the assembler places in each run: lines of the parts list, joints, and units that have any of it. */
function placedByAssembler(plan: CostPlan, offers: readonly OfferColumns[], runs: number) {
  const column = () => new Float64Array(runs)
  const [distinct, byMachine, byHand, starts] = [column(), column(), column(), column()]
  const used = column()
  const touched = new Set<number>()
  for (const part of plan.parts) {
    const joints = wholeFrom(0, `costRun: ${part.id}.joints`, part.joints) * part.perUnit
    used.fill(0)
    plan.offers.forEach(({ offer, isAssembled }, i) => {
      if (!isAssembled || part.placedBy[offer] !== 'assembler' || !part.neededFor.includes(offer)) return
      touched.add(i)
      add(used, columnOf(offers[i]!, 'starts', part.choice), 1)
    })
    add(part.byHand ? byHand : byMachine, used, joints)
    for (let k = 0; k < runs; k++) if (used[k]! > 0) distinct[k]! += 1
  }
  for (const i of touched) add(starts, offers[i]!.starts, 1)
  return { distinct, byMachine, byHand, starts }
}

function add(sum: Column, column: Column | undefined, times: number): void {
  if (column !== undefined) for (let k = 0; k < sum.length; k++) sum[k]! += column[k]! * times
}
