import 'server-only'
import { Op, type Transaction } from 'sequelize'
import type { OrderChangeInput } from '@/lib/contracts/orders'
import { minor } from '@/lib/core/brand'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { mayChangeOrder } from '@/lib/core/states/order-guards'
import { inTransaction } from '@/lib/db/in-transaction'
import { quoteChange } from '@/lib/queries/orders/quote-change'
import { applyChange, placesFor } from '@/lib/services/_steps/apply-change'
import { endOpenPayments } from '@/lib/services/_steps/end-open-payments'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { mailContract } from '@/lib/services/_steps/mail-contract'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { refundPart } from '@/lib/services/_steps/refund-part'
import { termsAfter, termsNow } from '@/lib/services/_steps/terms-of-change'
import { LIVE_ORDERS } from '@/lib/services/_steps/place-rules'
import { Order, OrderChange, PaymentAttempt, type Run } from '@/models'

type Cmd = { actor: Actor; orderId: string; input: OrderChangeInput; now: Date }

/**
 * Changes what an order under deposit is for, before the lock: offers, quantities, choices. Where the deposit falls, the
 * difference goes back at once and the change holds; where it rises, the change waits for the payment of the difference,
 * a purpose of its own, and takes its places when that arrives. A change not paid yet is replaced.
 * Refuses: not_found · payment_in_flight (an earlier difference is being paid) · not_allowed (not under deposit) · disputed ·
 * run_locked · limit_reached · no_place · nothing_changed · field mistakes · weights_missing.
 * Locks: run, order, attempts. Writes: the change; order, lines, counts, papers, refunds, mail, audit where it holds at
 * once. Repeat: refused as nothing_changed once it holds.
 */
export async function changeOrder(cmd: Cmd) {
  const { actor, orderId, now } = cmd
  const seen = await Order.findByPk(orderId, { attributes: ['personId'] })
  if (!seen || actor.kind !== 'person' || !can(actor, 'order:change', seen)) return refuse('not_found')
  const ended = await endOpenPayments(orderId, now)
  if (!ended.ok) return ended
  return inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    if (!locked) return refuse('not_found')
    return change(tx, locked, { ...cmd, byPersonId: actor.personId })
  })
}

async function change(
  tx: Transaction,
  { run, order }: { run: Run; order: Order },
  by: Cmd & { byPersonId: string },
) {
  if (order.state !== 'reserved') return refuse('not_allowed')
  if (order.disputedAt !== null) return refuse('disputed')
  const live = { orderId: order.id, state: [...LIVE] }
  if ((await PaymentAttempt.count({ where: live, transaction: tx })) > 0) return refuse('payment_in_flight')
  const quote = await quoteChange({ order, run, input: by.input, now: by.now, transaction: tx })
  if (!quote.ok) return quote
  const after = termsAfter(order, quote.value)
  const before = await termsNow(tx, order)
  if (isSame(before.lines, after.lines)) return refuse('nothing_changed')
  const may = await judge(tx, { run, order, units: quote.value.units, lines: after.lines })
  if (!may.ok) return may

  await OrderChange.update(
    { droppedAt: by.now },
    { where: { orderId: order.id, appliedAt: null, droppedAt: null }, transaction: tx },
  )
  const number = (await OrderChange.count({ where: { orderId: order.id }, transaction: tx })) + 1
  const differenceMinor = minor(after.depositMinor - order.depositMinor)
  const row = await OrderChange.create(
    {
      workshopId: order.workshopId,
      orderId: order.id,
      number,
      before,
      after,
      differenceMinor,
      at: by.now,
      byPersonId: by.byPersonId,
      appliedAt: null,
      droppedAt: null,
    },
    { transaction: tx },
  )
  if (differenceMinor > 0) return ok({ order: order.id, toPayMinor: differenceMinor, refundMinor: 0 })
  await applyChange(tx, { order, change: row, now: by.now })
  const { byPersonId, now } = by
  const amountMinor = -differenceMinor
  const refundMinor =
    amountMinor > 0 ? await refundPart(tx, { order, amountMinor, why: 'order_change', byPersonId, now }) : 0
  await mailContract(tx, order, { version: number + 1, now })
  return ok({ order: order.id, toPayMinor: 0, refundMinor })
}

async function judge(
  tx: Transaction,
  asked: { run: Run; order: Order; units: number; lines: { runOfferId: string; quantity: number }[] },
) {
  const { run, order, units, lines } = asked
  const { free } = await placesFor(tx, { order, run, lines })
  const others = { runId: run.id, personId: order.personId, id: { [Op.ne]: order.id }, kind: 'paid' }
  return mayChangeOrder({
    run: run.state,
    units,
    unitsNow: order.unitCount,
    unitsElsewhere:
      (await Order.sum('unitCount', { where: { ...others, state: [...LIVE_ORDERS] }, transaction: tx })) ?? 0,
    limit: run.limitPerPerson,
    free,
    waiting: await Order.count({ where: { runId: run.id, state: 'waiting' }, transaction: tx }),
  })
}

type Lines = readonly { runOfferId: string; quantity: number; choices: readonly { answerId: string }[] }[]

function isSame(before: Lines, after: Lines): boolean {
  const written = (lines: Lines) =>
    lines
      .map(({ runOfferId, quantity, choices }) =>
        [runOfferId, quantity, ...choices.map(({ answerId }) => answerId).sort()].join(' '),
      )
      .sort()
      .join('\n')
  return written(before) === written(after)
}
