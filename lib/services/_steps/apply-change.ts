import 'server-only'
import type { Transaction } from 'sequelize'
import { freeUnits } from '@/lib/core/orders/free'
import { reissuePrepayments } from '@/lib/services/_steps/prepayment-invoice'
import { recordMove } from '@/lib/services/_steps/record-move'
import { releasePlace } from '@/lib/services/_steps/release-place'
import { takePlace } from '@/lib/services/_steps/take-place'
import { type Order, type OrderChange, OrderLine, type Run, RunOffer } from '@/models'
import type { OrderTerms } from '@/models/json'

type Lines = readonly { runOfferId: string; quantity: number }[]

/**
 * How many more units an order would take with other lines, and how many are free for what grows in it (none where an
 * offer's own maximum is reached). The caller has locked the run. Locks, writes: nothing.
 */
export async function placesFor(
  tx: Transaction,
  { order, run, lines }: { order: Order; run: Run; lines: Lines },
): Promise<{ free: number; extra: number }> {
  const now = await OrderLine.findAll({ where: { orderId: order.id }, transaction: tx })
  const offers = await RunOffer.findAll({ where: { runId: run.id }, transaction: tx })
  const grown = lines.flatMap(({ runOfferId, quantity }) => {
    const more = quantity - (now.find((line) => line.runOfferId === runOfferId)?.quantity ?? 0)
    return more > 0 ? [{ runOfferId, quantity: more }] : []
  })
  const units = lines.reduce((sum, { quantity }) => sum + quantity, 0)
  return { free: freeUnits(run, offers, grown), extra: units - order.unitCount }
}

/**
 * Puts a change into effect: the order's lines and sums become those agreed, its places with them, and papers at rates it
 * no longer has are set right.
 * The caller has locked run and order. Writes: order, lines, counts, change, papers, audit, a job for who waits. Repeat: not
 * safe; the change says when it took effect.
 */
export async function applyChange(
  tx: Transaction,
  { order, change, now }: { order: Order; change: OrderChange; now: Date },
): Promise<void> {
  const { lines, sums } = change.after
  if (!sums) throw new Error(`change ${change.id} has no sums`)
  await releasePlace(tx, order)
  await OrderLine.destroy({ where: { orderId: order.id }, transaction: tx })
  await OrderLine.bulkCreate(
    lines.map((line, position) => rowOf(order, line, position)),
    { transaction: tx },
  )
  const unitCount = lines.reduce((sum, { quantity }) => sum + quantity, 0)
  await order.update({ ...sums, unitCount }, { transaction: tx })
  await takePlace(tx, order)
  await change.update({ appliedAt: now }, { transaction: tx })
  await reissuePrepayments(tx, order, now)
  await recordMove(tx, {
    workshopId: order.workshopId,
    subjectType: 'order',
    subjectId: order.id,
    from: order.state,
    event: 'changed',
    to: order.state,
    byPersonId: change.byPersonId,
    at: now,
  })
}

function rowOf(order: Order, line: OrderTerms['lines'][number], position: number) {
  const { workshopId, id: orderId } = order
  const { runOfferId, quantity, totalMinor, choices, agreed } = line
  if (!agreed) throw new Error(`order ${orderId} has a changed line without what was agreed`)
  return { workshopId, orderId, runOfferId, position, quantity, totalMinor, choices, ...agreed }
}
