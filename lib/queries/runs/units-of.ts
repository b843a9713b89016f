import 'server-only'
import { hasWithdrawalRight } from '@/lib/core/promises/withdrawal'
import type { OrderState } from '@/lib/core/states/order'
import type { OfferKind } from '@/models/words'
import type { OrderTally, RunFacts } from './run-facts'

/** States of an order whose deposit is here and whose place is taken. */
const UNDER_DEPOSIT: readonly OrderState[] = ['reserved', 'balance_due', 'paid', 'packed', 'posted']

const sum = (tallies: readonly OrderTally[]) => tallies.reduce((total, { units }) => total + units, 0)

const isUnderDeposit = ({ state, kind }: OrderTally) => kind === 'paid' && UNDER_DEPOSIT.includes(state)

function byOffer(tallies: readonly OrderTally[]): { [K in OfferKind]?: number } {
  const units: { [K in OfferKind]?: number } = {}
  for (const { offer, units: count } of tallies) units[offer] = (units[offer] ?? 0) + count
  return units
}

/**
 * A run's units as they count: under deposit (towards the minimum; orders entered by hand do not), held while someone
 * pays, waiting, and everything that has to be built.
 */
export function unitsOf({ orders }: Pick<RunFacts, 'orders'>) {
  const underDeposit = orders.filter(isUnderDeposit)
  const manual = orders.filter(({ state, kind }) => kind === 'manual' && UNDER_DEPOSIT.includes(state))
  return {
    deposited: sum(underDeposit),
    held: sum(orders.filter(({ state }) => state === 'awaiting_deposit')),
    waiting: sum(orders.filter(({ state }) => state === 'waiting')),
    depositedByOffer: byOffer(underDeposit),
    toBuildByOffer: byOffer([...underDeposit, ...manual]),
    withdrawable: sum(underDeposit.filter(({ country }) => hasWithdrawalRight(country))),
  }
}
