import 'server-only'
import { QueryTypes } from 'sequelize'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { PUT_OFF, putOffCharge } from '@/lib/services/_steps/put-off-charge'
import { startBulk } from '@/lib/services/_steps/start-bulk'

/**
 * The day has come on which a balance is charged: a bulk job over every order of the run whose day it is, so that n of m
 * can be counted. The first order of a run to fall due brings the others along.
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
