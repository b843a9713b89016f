import 'server-only'
import { type Transaction } from 'sequelize'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { isOrderAtEnd } from '@/lib/core/states/order-guards'
import { mayClose } from '@/lib/core/states/run-guards'
import { inTransaction } from '@/lib/db/in-transaction'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { moveRun } from '@/lib/services/_steps/move-run'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { recordDecision } from '@/lib/services/_steps/record-decision'
import { dropRunDues } from '@/lib/services/_steps/set-run-dues'
import { storeOutcomes } from '@/lib/services/_steps/store-outcomes'
import { Order, PaymentAttempt, Problem, Refund, Run } from '@/models'

/**
 * Closes a run that is done: what became of its people is stored for the next forecast, whoever still waited is told.
 * Refuses: forbidden · not_found · not_allowed · order_short_of_end · problem_open · refund_pending · attempt_unknown.
 * Locks: the run, waiting orders. Writes: run, outcomes, orders, decision, mails, due rows, audit; its public page is made
 * anew. Repeat: refused as not_allowed.
 */
export function closeRun(cmd: { actor: Actor; workshopId: string; runId: string; now: Date }) {
  const { actor, workshopId, runId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'run:close', { workshopId })) return refuse('forbidden')
    const run = await Run.findOne({
      where: { id: runId, workshopId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!run) return refuse('not_found')
    const orders = await Order.findAll({
      where: { runId },
      order: [['id', 'ASC']],
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    const facts = await readClosing(tx, orders)
    const may = mayClose({ ...facts, conversionsStored: true })
    if (!may.ok) return may
    await storeOutcomes(tx, run, now)
    const { personId: byPersonId } = actor
    const moved = await moveRun(tx, run, 'close', { now, byPersonId, change: { closedAt: now } })
    if (!moved.ok) return moved
    await dropRunDues(tx, run)
    for (const order of orders.filter(({ state }) => state === 'waiting')) await endWaiting(tx, order, now)
    await recordDecision(tx, {
      run,
      kind: 'close',
      reason: null,
      inputs: facts,
      figures: { orders: orders.length },
      byPersonId,
      now,
    })
    return ok({ state: run.state })
  })
}

async function readClosing(tx: Transaction, orders: readonly Order[]) {
  const orderId = orders.map(({ id }) => id)
  const how = { transaction: tx }
  return {
    ordersShortOfEnd: orders.filter(({ state }) => state !== 'waiting' && !isOrderAtEnd(state)).length,
    openProblems: await Problem.count({ where: { orderId, state: ['open', 'answered'] }, ...how }),
    pendingRefunds: await Refund.count({
      where: { orderId, state: ['requested', 'sent', 'unknown', 'pending'] },
      ...how,
    }),
    unknownAttempts: await PaymentAttempt.count({
      where: { orderId, state: ['requested', 'sent', 'unknown'] },
      ...how,
    }),
  }
}

async function endWaiting(tx: Transaction, order: Order, now: Date): Promise<void> {
  const moved = await moveOrder(tx, order, 'run_closed', { now, change: { cancelCause: 'run_closed' } })
  if (!moved.ok) throw new Error(`order ${order.id} waits but cannot end with its run`)
  const { ofOrder } = await orderMailFacts(tx, order)
  await queueMail(tx, {
    kind: 'order_cancelled',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    props: { ...ofOrder, currency: order.currency, cause: 'run_closed', reason: null, refundMinor: 0 },
    now,
  })
}
