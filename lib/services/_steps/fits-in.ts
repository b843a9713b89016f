import 'server-only'
import type { Transaction } from 'sequelize'
import { type Order, OrderLine, Run, RunOffer } from '@/models'

type Wanted = { runOfferId: string; quantity: number }

/** Units of a run neither taken nor held for these lines: none when an offer's own maximum leaves too few. */
export function freeFor(run: Run, offers: readonly RunOffer[], lines: readonly Wanted[]): number {
  const isOver = lines.some(({ runOfferId, quantity }) => {
    const offer = offers.find(({ id }) => id === runOfferId)
    return offer?.maximum != null && offer.committedUnits + quantity > offer.maximum
  })
  return isOver ? 0 : run.maximum - run.committedUnits
}

/**
 * Whether an order without a place fits into its run as it is now. The caller has locked the run.
 * Locks: nothing. Writes: nothing.
 */
export async function fitsIn(tx: Transaction, order: Order): Promise<boolean> {
  const run = await Run.findByPk(order.runId, { transaction: tx, rejectOnEmpty: true })
  const offers = await RunOffer.findAll({ where: { runId: order.runId }, transaction: tx })
  const lines = await OrderLine.findAll({ where: { orderId: order.id }, transaction: tx })
  return order.unitCount <= freeFor(run, offers, lines)
}
