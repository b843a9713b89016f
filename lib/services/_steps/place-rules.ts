import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { refuse, type Result } from '@/lib/core/result'
import { freeUnits } from '@/lib/core/orders/free'
import { mayPlace } from '@/lib/core/states/order-guards'
import type { OrderState } from '@/lib/core/states/order'
import { dayIn } from '@/lib/core/time/zone'
import type { OrderQuote } from '@/lib/queries/orders/quote-order'
import { Invitation, Order, type Run, RunOffer, type Workshop } from '@/models'

/** States in which an order of a person counts towards the limit. */
export const LIVE_ORDERS: OrderState[] = [
  'waiting',
  'awaiting_deposit',
  'reserved',
  'balance_due',
  'paid',
  'packed',
]

/**
 * Whether a person may place this order in a run that is locked, and whether it takes a place or queues.
 * Refuses: already_ordered (a live order of theirs goes to the same address) and what `mayPlace` refuses.
 * Locks: nothing more. Writes: nothing.
 */
export async function placeOrQueue(
  tx: Transaction,
  asked: {
    run: Run
    workshop: Workshop
    personId: string
    fingerprint: string
    quote: OrderQuote
    now: Date
  },
): Promise<
  Result<
    'place' | 'queue',
    'already_ordered' | 'run_not_open' | 'decide_by_past' | 'not_open_to_all_yet' | 'limit_reached'
  >
> {
  const { run, workshop, personId, quote, now } = asked
  const mine = await Order.findAll({
    where: { runId: run.id, personId, kind: 'paid', state: LIVE_ORDERS },
    attributes: ['unitCount', 'addressFingerprint'],
    transaction: tx,
  })
  if (mine.some(({ addressFingerprint }) => addressFingerprint === asked.fingerprint))
    return refuse('already_ordered')
  const offers = await RunOffer.findAll({ where: { runId: run.id }, transaction: tx })
  const lines = quote.lines.map(({ offer, quantity }) => ({ runOfferId: offer.runOfferId, quantity }))
  return mayPlace({
    run: run.state,
    today: dayIn(now, workshop.timeZone),
    decideBy: run.decideByOn,
    openToThem: await isOpenTo(tx, run, personId, now),
    units: quote.units,
    unitsBefore: mine.reduce((sum, { unitCount }) => sum + unitCount, 0),
    limit: run.limitPerPerson,
    free: freeUnits(run, offers, lines),
    waiting: await Order.count({ where: { runId: run.id, state: 'waiting' }, transaction: tx }),
  })
}

/** During the head start only those invited may order. */
async function isOpenTo(tx: Transaction, run: Run, personId: string, now: Date): Promise<boolean> {
  if (run.opensToAllAt !== null && run.opensToAllAt <= now) return true
  const where = { runId: run.id, personId, state: { [Op.in]: ['sent', 'ordered'] } }
  return (await Invitation.count({ where, transaction: tx })) > 0
}
