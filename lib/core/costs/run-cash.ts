import { minor, type Day, type Minor } from '@/lib/core/brand'
import type { CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import type { LineKind } from '@/lib/core/costs/run-line'
import { roundHalfUp } from '@/lib/core/money/round'
import { addDays } from '@/lib/core/time/day'

/** When the money of a run moves. Calendar days. */
export type RunDays = {
  /** One-off costs are paid. */
  readonly spentOn: Day
  /** The decision: deposits are released by the provider from here on. */
  readonly lockOn: Day
  /** Parts, boards and assembly are paid. */
  readonly boughtOn: Day
  /** Balances are paid. */
  readonly balancesOn: Day
  /** Work and packaging are paid. */
  readonly workedOn: Day
  /** Postage and the sales tax are paid. */
  readonly postedOn: Day
}

/** One movement of money, + in and − out, and what it is for. */
export type CashEvent = {
  readonly day: Day
  readonly amount: Minor
  readonly what: LineKind | 'deposits' | 'balances' | 'reserve' | 'sales_tax'
}

const PAID_ON: Readonly<Record<LineKind, keyof RunDays | 'with_money'>> = {
  one_off: 'spentOn',
  board: 'boughtOn',
  front_panel: 'boughtOn',
  part: 'boughtOn',
  stencil: 'boughtOn',
  assembly: 'boughtOn',
  freight: 'boughtOn',
  duty: 'boughtOn',
  import_tax: 'boughtOn',
  labour: 'workedOn',
  packaging: 'workedOn',
  per_unit: 'workedOn',
  postage: 'postedOn',
  payment_fee: 'with_money',
  refund_fee: 'balancesOn',
  dispute_fee: 'balancesOn',
}

/**
 * The movements of money of a run, for `cashLow`: deposits and balances reach the bank after the provider's delay, less
 * its fees and the share it holds back, which follows later; everything else is paid on its day.
 * Units:    as `costRun`; the events add up to its profit.
 * Domain:   as `costRun`; calendar days → otherwise RangeError.
 * Rounding: fees on the two payments and the reserve half-up, the second of each pair taking what is left.
 * Note:     deposits are held until the lock (payouts are manual), so they count from there. Import tax that is reclaimed is left
 *           out, though it may be paid and come back.
 * @example  runCash(emptyPlan('EUR'), {}, { spentOn: '2026-05-01', lockOn: '2026-06-01', boughtOn: '2026-06-02', balancesOn: '2026-08-01', workedOn: '2026-08-05', postedOn: '2026-08-20' })  // → []
 */
export function runCash(
  plan: CostPlan,
  quantities: Readonly<Record<string, number>>,
  days: RunDays,
): CashEvent[] {
  const { lines, paid, deposits, revenue } = costRun(plan, quantities)
  const fees = lines.reduce((sum, { kind, amount }) => sum + (PAID_ON[kind] === 'with_money' ? amount : 0), 0)
  const depositFees = paid === 0 ? 0 : roundHalfUp(BigInt(fees) * BigInt(deposits), BigInt(paid))
  const events: CashEvent[] = [
    ...payouts(plan, 'deposits', days.lockOn, deposits - depositFees),
    ...payouts(plan, 'balances', days.balancesOn, paid - deposits - (fees - depositFees)),
    { day: days.postedOn, amount: minor(revenue - paid), what: 'sales_tax' },
  ]
  for (const { kind, amount } of lines) {
    const on = PAID_ON[kind]
    if (on !== 'with_money') events.push({ day: days[on], amount: minor(-amount), what: kind })
  }
  return events.filter(({ amount }) => amount !== 0)
}

function payouts({ payout }: CostPlan, what: 'deposits' | 'balances', day: Day, amount: number): CashEvent[] {
  const held = roundHalfUp(BigInt(amount) * BigInt(payout.reserveBasisPoints), 10_000)
  const arrives = addDays(day, payout.delayDays)
  return [
    { day: arrives, amount: minor(amount - held), what },
    { day: addDays(arrives, payout.reserveDays), amount: minor(held), what: 'reserve' },
  ]
}
