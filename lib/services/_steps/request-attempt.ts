import 'server-only'
import { randomUUID } from 'node:crypto'
import type { Transaction } from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import type { Purpose } from '@/lib/gateways/payments/types'
import { setDue } from '@/lib/jobs/set-due'
import { hashOfParams, type CheckoutParams, type SavedCardParams } from '@/lib/services/_steps/attempt-params'
import { nextLookUp } from '@/lib/services/_steps/next-look-up'
import { recordMove } from '@/lib/services/_steps/record-move'
import { type Order, PaymentAttempt } from '@/models'
import type { AttemptMethod } from '@/models/words'

type Asked = {
  order: Order
  purpose: Purpose
  amountMinor: Minor
  method: AttemptMethod
  account: string
  now: Date
  /** Everything the call sends; the attempt's id is known before its row is written. */
  paramsOf: (attemptId: string) => CheckoutParams | SavedCardParams
}

/**
 * Act 1 of a payment: writes down that money is asked for, with its own key and the very parameters of the call, and
 * when to look it up should no answer come. The caller has locked the order and seen that no attempt of this purpose is
 * live; the database allows only one.
 * Locks: nothing more. Writes: one attempt, one audit entry, one due row. Repeat: refused by the database.
 */
export async function requestAttempt(tx: Transaction, asked: Asked): Promise<PaymentAttempt> {
  const { order, purpose, method, account, now } = asked
  const where = { orderId: order.id, purpose }
  const last = await PaymentAttempt.max<number | null, PaymentAttempt>('sequence', { where, transaction: tx })
  const sequence = (last ?? 0) + 1
  const id = randomUUID()
  const params = asked.paramsOf(id)
  const attempt = await PaymentAttempt.create(
    {
      id,
      workshopId: order.workshopId,
      orderId: order.id,
      purpose,
      sequence,
      method,
      amountMinor: asked.amountMinor,
      currency: order.currency,
      idempotencyKey: `${purpose}:${order.id}:${sequence}`,
      paramsHash: hashOfParams(params),
      params,
      providerAccountId: account,
      sessionExpiresAt: 'expiresAt' in params ? new Date(params.expiresAt) : null,
      requestedAt: now,
    },
    { transaction: tx },
  )
  await recordMove(tx, {
    workshopId: attempt.workshopId,
    subjectType: 'attempt',
    subjectId: id,
    from: null,
    event: 'request',
    to: 'requested',
    byPersonId: null,
    at: now,
  })
  const { workshopId } = attempt
  await setDue(tx, { kind: 'attempt_look_up', subjectId: id, workshopId, at: nextLookUp(attempt, now) })
  return attempt
}
