import 'server-only'
import { Op, QueryTypes, type Transaction } from 'sequelize'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { setDue } from '@/lib/jobs/set-due'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { PUT_OFF, putOffCharge } from '@/lib/services/_steps/put-off-charge'
import { startBulk } from '@/lib/services/_steps/start-bulk'
import { Order, type Run } from '@/models'

/** Orders announced by one press fall due seconds apart: they wait for each other. */
const TOGETHER_MS = 600_000

/**
 * The day has come on which a balance is charged: a bulk job over every order of the run whose day it is, so that n of m
 * can be counted. Orders that fall due within ten minutes of each other go together.
 * While a bank decides a dispute the charge is put off by a day.
 * Locks: run, order. Writes: a bulk job. Repeat: safe; an order is in one such job per announcement.
 */
export function startBalanceCharges(cmd: { orderId: string; now: Date }) {
  const { orderId, now } = cmd
  return inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    if (!locked || locked.run.state !== 'locked') return ok({ orders: 0 })
    const { run, order } = locked
    if (order.state === 'balance_due' && order.disputedAt !== null) await putOffCharge(tx, order, now)
    const last = await lastSoon(tx, run, now)
    if (last !== null) {
      const { id: subjectId, workshopId } = order
      await setDue(tx, { kind: 'balance_charge', subjectId, workshopId, at: last })
      return ok({ orders: 0 })
    }
    const rows = await sequelize.query<{ id: string }>(
      `select o.id from orders o
       where o.run_id = :runId and o.state = 'balance_due' and o.balance_charge_at <= :now
         and o.balance_failed_at is null and o.disputed_at is null
         and not exists (
           select 1 from bulk_items i join bulk_jobs j on j.id = i.bulk_job_id
           where i.subject_id = o.id and j.kind = 'charge_balances' and j.created_at >= o.balance_asked_at
             and coalesce(i.reason, '') not in (:putOff))
       order by o.number`,
      {
        replacements: { runId: run.id, now: now.toISOString(), putOff: [...PUT_OFF] },
        type: QueryTypes.SELECT,
        transaction: tx,
      },
    )
    if (rows.length === 0) return ok({ orders: 0 })
    const subjectIds = rows.map(({ id }) => id)
    await startBulk(tx, { kind: 'charge_balances', run, subjectIds, byPersonId: null, now })
    return ok({ orders: rows.length })
  })
}

/** When the last of those whose day comes within ten minutes is due; null when nobody's is. */
async function lastSoon(tx: Transaction, run: Run, now: Date): Promise<Date | null> {
  const soon = { [Op.gt]: now, [Op.lte]: new Date(now.getTime() + TOGETHER_MS) }
  const order = await Order.findOne({
    where: { runId: run.id, state: 'balance_due', balanceChargeAt: soon },
    order: [['balanceChargeAt', 'DESC']],
    transaction: tx,
  })
  return order?.balanceChargeAt ?? null
}
