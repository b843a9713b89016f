import { ok, refuse, type Result } from '@/lib/core/result'
import type { OrderState } from '@/lib/core/states/order'

/** Why a parcel must neither be packed nor handed over. */
export type ParcelStop =
  | 'order_cancelled'
  | 'order_not_paid'
  | 'order_disputed'
  | 'destination_paused'
  | 'on_hold'
  | 'label_void'
  | 'in_other_batch'

const ENDED: readonly OrderState[] = ['cancelled', 'expired', 'lapsed', 'withdrawn', 'returned']

/**
 * Whether a parcel of an order may be packed or handed over now.
 * Refuses: 'order_cancelled' (the order has ended, whichever way), 'order_not_paid', 'order_disputed' (the buyer's bank
 *          decides first), 'destination_paused', 'on_hold' (the workshop stopped this parcel), 'label_void' (the address
 *          changed after its papers were printed), 'in_other_batch' (another packer has taken it), in this order.
 *          A replacement goes out for an order that is posted already, and for no other.
 * Source:  states.md, order: paid –pack→ packed –hand_over→ posted; a dispute blocks packing.
 * @example mayGoOut({ order: 'paid', disputed: false, destinationPaused: false, onHold: false, labelVoid: false })  // → ok(true)
 * @example mayGoOut({ order: 'paid', disputed: false, destinationPaused: false, onHold: false, labelVoid: false, inOtherBatch: true })  // → refuse('in_other_batch')
 * @example mayGoOut({ order: 'cancelled', disputed: true, destinationPaused: false, onHold: false, labelVoid: false })  // → refuse('order_cancelled')
 */
export function mayGoOut(facts: {
  readonly order: OrderState
  readonly disputed: boolean
  readonly destinationPaused: boolean
  readonly onHold: boolean
  readonly labelVoid: boolean
  readonly inOtherBatch?: boolean
  readonly isReplacement?: boolean
}): Result<true, ParcelStop> {
  if (ENDED.includes(facts.order)) return refuse('order_cancelled')
  const goes: readonly OrderState[] = facts.isReplacement ? ['posted'] : ['paid', 'packed']
  if (!goes.includes(facts.order)) return refuse('order_not_paid')
  if (facts.disputed) return refuse('order_disputed')
  if (facts.destinationPaused) return refuse('destination_paused')
  if (facts.onHold) return refuse('on_hold')
  if (facts.labelVoid) return refuse('label_void')
  return facts.inOtherBatch ? refuse('in_other_batch') : ok(true)
}
