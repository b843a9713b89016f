import type { Day } from '@/lib/core/brand'
import { ok, refuse, type Result } from '@/lib/core/result'
import type { OrderState } from '@/lib/core/states/order'
import type { RunState } from '@/lib/core/states/run'
import { daysBetween } from '@/lib/core/time/day'

const BEFORE_PACKING: readonly OrderState[] = ['reserved', 'balance_due', 'paid']

/**
 * Whether a buyer may withdraw from an order after the lock, and what that is: the order is cancelled, or what was posted
 * comes back first. By law at any time until the last day of it; without a right by law until packing.
 * Refuses: 'run_not_locked' (before the lock an order is cancelled), 'packed_already' (without a right by law),
 *          'withdrawal_over' (the day after `endsOn` and later), 'not_allowed' (nothing to withdraw from).
 * Domain:  `endsOn` null while the last piece has not arrived.
 * Source:  product.md, after the lock; Directive 2011/83/EU Art. 9 (from memory).
 * @example mayWithdraw({ run: 'locked', state: 'paid', hasRight: false, endsOn: null, today: '2026-05-01' })  // → ok('cancel')
 * @example mayWithdraw({ run: 'locked', state: 'posted', hasRight: true, endsOn: '2026-05-01', today: '2026-05-02' })  // → refuse('withdrawal_over')
 */
export function mayWithdraw(facts: {
  readonly run: RunState
  readonly state: OrderState
  readonly hasRight: boolean
  readonly endsOn: Day | null
  readonly today: Day
}): Result<'cancel' | 'return', 'run_not_locked' | 'packed_already' | 'withdrawal_over' | 'not_allowed'> {
  const { state, hasRight, endsOn } = facts
  if (facts.run !== 'locked' && facts.run !== 'closed') return refuse('run_not_locked')
  if (BEFORE_PACKING.includes(state)) return ok('cancel')
  if (state !== 'packed' && state !== 'posted') return refuse('not_allowed')
  if (!hasRight) return refuse('packed_already')
  if (state === 'packed') return ok('cancel')
  return endsOn !== null && daysBetween(facts.today, endsOn) < 0 ? refuse('withdrawal_over') : ok('return')
}
