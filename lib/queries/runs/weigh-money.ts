import 'server-only'
import type { RunWeighed } from '@/lib/contracts/runs'
import { callOffCost } from '@/lib/core/costs/call-off'
import { cashLow } from '@/lib/core/costs/cash'
import type { Curve } from '@/lib/core/costs/curve'
import type { CostPlan } from '@/lib/core/costs/plan'
import { runCash } from '@/lib/core/costs/run-cash'
import { divide } from '@/lib/core/money/allocate'
import { runDaysOf } from './run-days-of'
import type { RunFacts } from './run-facts'

type Money = { plan: CostPlan; mix: Record<string, number>; curve: Curve; deposited: number }

/** What is left when a tenth does not pay, and how low the bank balance gets at the units a go would be about today. */
export function weighMoney(facts: RunFacts, money: Money): Pick<RunWeighed, 'tenthFails' | 'cashLow'> {
  const { plan, mix, curve, deposited } = money
  const { minimum, maximum } = facts.run
  // Whole tenths, so that no float decides about a unit.
  const paying = Math.min(maximum, Math.floor((deposited * 9) / 10))
  const profitMinor = curve[paying - 1]?.profit ?? 0 - callOffCost(plan, mix)(deposited)
  return {
    tenthFails: deposited === 0 ? null : { units: paying, profitMinor },
    cashLow: lowAt(facts, money, Math.min(maximum, Math.max(minimum, deposited))),
  }
}

function lowAt(facts: RunFacts, { plan, mix }: Money, units: number): RunWeighed['cashLow'] {
  const kinds = Object.keys(mix)
  const split = divide(
    units,
    kinds.map((kind) => mix[kind] ?? 0),
  )
  if (!split.ok) return null
  const quantities = Object.fromEntries(kinds.map((kind, index) => [kind, split.value[index] ?? 0]))
  const { low, day } = cashLow(runCash(plan, quantities, runDaysOf(facts)))
  return { units, lowMinor: low, on: day }
}
