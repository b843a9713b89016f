import 'server-only'
import type { Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import { ok, refuse } from '@/lib/core/result'
import { PLACE_OFFER_HOURS } from '@/lib/core/states/order-guards'
import { inTransaction } from '@/lib/db/in-transaction'
import { setDue } from '@/lib/jobs/set-due'
import { paths } from '@/lib/paths'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { fitsIn } from '@/lib/services/_steps/fits-in'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { takePlace } from '@/lib/services/_steps/take-place'
import { Order, Run, Workshop } from '@/models'

/**
 * Offers free places of a run to those who wait, in order of arrival, for 48 hours each. Nobody overtakes: when the next
 * in line does not fit, nobody behind is asked. Also once the run is locked; never while the workshop is suspended.
 * Refuses: not_found. Locks: the run, the orders offered a place. Writes: orders, counts, due rows, mails.
 * Repeat: safe; a place offered is taken.
 */
export async function offerFreedPlace(cmd: { runId: string; now: Date }) {
  return inTransaction(async (tx) => {
    const run = await Run.findByPk(cmd.runId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!run) return refuse('not_found')
    const workshop = await Workshop.findByPk(run.workshopId, { transaction: tx, rejectOnEmpty: true })
    const isOpen = run.state === 'taking_deposits' || run.state === 'locked'
    if (!isOpen || workshop.state !== 'open') return ok({ offered: 0 })
    for (let offered = 0; ; offered += 1) {
      const next = await Order.findOne({
        where: { runId: run.id, state: 'waiting' },
        order: [['queueNo', 'ASC']],
        transaction: tx,
        lock: tx.LOCK.UPDATE,
      })
      if (!next || !(await fitsIn(tx, next))) return ok({ offered })
      await offer(tx, next, cmd.now)
    }
  })
}

async function offer(tx: Transaction, order: Order, now: Date): Promise<void> {
  const holdUntil = new Date(now.getTime() + PLACE_OFFER_HOURS * 3_600_000)
  const holdAttempts = order.holdAttempts + 1
  const moved = await moveOrder(tx, order, 'place_offered', {
    now,
    change: { holdUntil, holdAttempts, placeOfferedAt: now },
  })
  if (!moved.ok) throw new Error(`order ${order.id} waits but cannot be offered a place`)
  await takePlace(tx, order)
  const { id: subjectId, workshopId, personId, currency, depositMinor } = order
  await setDue(tx, { kind: 'hold_ended', subjectId, workshopId, at: holdUntil })
  const { ofOrder } = await orderMailFacts(tx, order)
  await queueMail(tx, {
    kind: 'place_free',
    workshopId,
    personId,
    subjectId,
    version: holdAttempts,
    props: {
      ...ofOrder,
      currency,
      depositMinor,
      payUrl: `${env().BASE_URL}${paths.accountOrder(subjectId)}`,
      holdUntil: holdUntil.toISOString(),
    },
    now,
  })
}
