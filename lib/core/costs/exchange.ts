import { readDecimal, timesFraction } from '@/lib/core/costs/decimal'
import type { PlanRate } from '@/lib/core/costs/plan-buying'
import { exponentOf } from '@/lib/core/money/currency'
import { wholeFrom } from '@/lib/core/stats/argument'

/**
 * A function that turns minor units of one currency into those of the selling currency; null when no rate is known.
 * The margin is added to the rate. The selling currency itself needs no rate and bears no margin.
 * Units:    minor units of `from` in, of `to` out; the rate is in major units.
 * Domain:   ISO 4217 currencies, a decimal rate, whole margin ≥ 0, amounts whole ≥ 0 → otherwise RangeError.
 * Rounding: half-up, once per amount.
 * Accuracy: exact before the rounding.
 * @example  exchange('USD', 'EUR', [{ currency: 'USD', rate: '0.9', on: '2026-05-01', marginBasisPoints: 200 }])!(1000)  // → 918
 */
export function exchange(
  from: string,
  to: string,
  rates: readonly PlanRate[],
): ((amount: number) => number) | null {
  if (from === to) return (amount) => amount
  const known = rates.find(({ currency }) => currency === from)
  if (known === undefined) return null
  const rate = readDecimal('exchange: rate', known.rate)
  const margin = 10_000n + BigInt(wholeFrom(0, 'exchange: marginBasisPoints', known.marginBasisPoints))
  return timesFraction(
    rate.digits * margin * 10n ** BigInt(exponentOf(to)),
    rate.scale * 10_000n * 10n ** BigInt(exponentOf(from)),
  )
}
