import 'server-only'
import { setTimeout as pause } from 'node:timers/promises'
import { log } from '@/lib/config/log'
import type { BulkKind } from '@/lib/contracts/bulk'
import type { Result } from '@/lib/core/result'
import { clock } from '@/lib/gateways/clock'
import type { Task } from '@/lib/jobs/task'
import { getNextBulkItem } from '@/lib/queries/bulk/get-next-bulk-item'
import { endOpenPayments } from '@/lib/services/_steps/end-open-payments'
import { finishBulk } from '@/lib/services/bulk/finish-bulk'
import { settleBulkItem } from '@/lib/services/bulk/settle-bulk-item'
import { workBulkItem } from '@/lib/services/bulk/work-bulk-item'
import { chargeBalance } from '@/lib/services/payments/charge-balance'

type Item = { id: string; subjectId: string }
type Worker = (item: Item, now: Date) => Promise<Result<unknown, string>>

const inOneAct: Worker = ({ id }, now) => workBulkItem({ itemId: id, now })

const WORKERS: Readonly<Record<BulkKind, Worker>> = {
  invite: inOneAct,
  tell_locked: inOneAct,
  tell_changed: inOneAct,
  ask_balances: inOneAct,
  call_off: async (item, now) => {
    const ended = await endOpenPayments(item.subjectId, now)
    return ended.ok ? inOneAct(item, now) : ended
  },
  charge_balances: async ({ id, subjectId }, now) => {
    const charged = await chargeBalance({ orderId: subjectId, now })
    if (!charged.ok && charged.reason === 'rate_limited') return charged
    return settleBulkItem({ itemId: id, reason: whyNot(charged), now })
  },
}

/** A charge the bank wants the buyer for did not succeed, though it may still: the buyer has been written to. */
function whyNot(charged: Awaited<ReturnType<typeof chargeBalance>>): string | null {
  if (!charged.ok) return charged.reason
  const { outcome } = charged.value
  return outcome === 'captured' || outcome === 'not_due' || outcome === 'in_flight' ? null : outcome
}

/** Rows a second whose deed asks the provider, which takes 25 calls a second of one kind. Own rule, below its limit. */
export const CHARGES_PER_SECOND = 20
const ASKS_PROVIDER: readonly BulkKind[] = ['charge_balances', 'call_off']

/** Waits for the next turn: turns come evenly, however long what is done in them takes. */
function turns(perSecond: number): () => Promise<void> {
  let next = 0
  return async () => {
    const now = performance.now()
    const at = Math.max(now, next)
    next = at + 1000 / perSecond
    if (at > now) await pause(at - now)
  }
}

/**
 * Works a bulk job's rows one by one, each ticked off as it is done: a killed worker goes on where it was. Rows that cannot
 * be done now (a payment in flight) are passed over, and the job is tried again for them.
 */
export const runBulk: Task<'run_bulk'> = async ({ bulkId }) => {
  const passedOver: string[] = []
  const turn = turns(CHARGES_PER_SECOND)
  for (;;) {
    const item = await getNextBulkItem({ bulkId, passedOver })
    if (item === null) break
    if (ASKS_PROVIDER.includes(item.kind)) await turn()
    try {
      const done = await WORKERS[item.kind](item, await clock.now())
      if (!done.ok) passedOver.push(item.id)
    } catch (error) {
      passedOver.push(item.id)
      log().error({ bulk: bulkId, item: item.id, kind: item.kind, error }, 'bulk item failed')
    }
  }
  await finishBulk({ bulkId, now: await clock.now() })
  if (passedOver.length > 0)
    throw new Error(`${passedOver.length} rows of the bulk job ${bulkId} wait for another try`)
}
