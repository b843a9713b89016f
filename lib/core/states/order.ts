import { movesFrom, type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where an order stands; part-posted is progress, not a state. */
export type OrderState =
  | 'awaiting_deposit'
  | 'waiting'
  | 'paid'
  | 'cancelled'
  | 'reserved'
  | 'expired'
  | 'balance_due'
  | 'lapsed'
  | 'packed'
  | 'posted'
  | 'withdrawn'
  | 'returned'

/** What moves an order on. */
export type OrderEvent =
  | 'place'
  | 'queue'
  | 'enter'
  | 'place_offered'
  | 'leave'
  | 'run_closed'
  | 'deposit_captured'
  | 'hold_ended'
  | 'cancel'
  | 'late_capture'
  | 'ask_balance'
  | 'nothing_due'
  | 'balance_captured'
  | 'lapse'
  | 'reinstate'
  | 'cancel_with_right'
  | 'run_called_off'
  | 'pack'
  | 'unpack'
  | 'hand_over'
  | 'withdraw'
  | 'return_received'

/**
 * The moves of an order: a place in a run, its two payments, its fulfilment.
 * A dispute is a date on the order, not a state; it blocks pack, lapse and refund.
 * Source: states.md of the design.
 * @example next(ORDER_MOVES, 'awaiting_deposit', 'deposit_captured')  // → ok('reserved')
 */
export const ORDER_MOVES: readonly Move<OrderState, OrderEvent>[] = [
  { from: null, event: 'place', to: 'awaiting_deposit' },
  { from: null, event: 'queue', to: 'waiting' },
  { from: null, event: 'enter', to: 'paid' },
  { from: 'waiting', event: 'place_offered', to: 'awaiting_deposit' },
  { from: 'waiting', event: 'leave', to: 'cancelled' },
  { from: 'waiting', event: 'run_closed', to: 'cancelled' },
  { from: 'awaiting_deposit', event: 'deposit_captured', to: 'reserved' },
  { from: 'awaiting_deposit', event: 'hold_ended', to: 'expired' },
  { from: 'awaiting_deposit', event: 'cancel', to: 'cancelled' },
  { from: 'expired', event: 'late_capture', to: 'reserved' },
  { from: 'reserved', event: 'cancel', to: 'cancelled' },
  { from: 'reserved', event: 'ask_balance', to: 'balance_due' },
  { from: 'reserved', event: 'nothing_due', to: 'paid' },
  { from: 'balance_due', event: 'balance_captured', to: 'paid' },
  { from: 'balance_due', event: 'lapse', to: 'lapsed' },
  { from: 'lapsed', event: 'reinstate', to: 'balance_due' },
  ...movesFrom(['reserved', 'balance_due', 'paid'], 'cancel_with_right', 'cancelled'),
  ...movesFrom(
    ['waiting', 'awaiting_deposit', 'reserved', 'balance_due', 'paid', 'packed'],
    'run_called_off',
    'cancelled',
  ),
  { from: 'paid', event: 'pack', to: 'packed' },
  { from: 'packed', event: 'unpack', to: 'paid' },
  { from: 'packed', event: 'hand_over', to: 'posted' },
  { from: 'posted', event: 'withdraw', to: 'withdrawn' },
  ...movesFrom(['posted', 'withdrawn'], 'return_received', 'returned'),
]
