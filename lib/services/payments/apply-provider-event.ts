import 'server-only'
import { ok, refuse, type Result } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import type { ProviderChange } from '@/lib/gateways/payments/changes'
import { readEvent } from '@/lib/gateways/payments/read-event'
import { attemptOfChange } from '@/lib/services/_steps/attempt-of-change'
import { recordDispute } from '@/lib/services/_steps/record-dispute'
import { recordPayout } from '@/lib/services/_steps/record-payout'
import { recordRefundNews } from '@/lib/services/_steps/record-refund-news'
import { settle } from '@/lib/services/_steps/settle-attempt'
import { ProviderEvent } from '@/models'

type Applied = { outcome: string; refreshAccount: string | null }

/**
 * Applies a stored event. Of a payment it only says which one to look at: the provider's present word is what is written
 * down, so that events may come twice, late or out of order. Refunds and disputes move by their tables.
 * Refuses: not_found · provider_unreachable (the job runs again). Locks: run, order, attempt or refund. Writes: what
 * follows, and when the event was applied. Repeat: safe. `refreshAccount`: an account to be asked about, by the task.
 */
export async function applyProviderEvent(cmd: {
  eventId: string
  now: Date
}): Promise<Result<Applied, 'not_found' | 'provider_unreachable'>> {
  const row = await ProviderEvent.findByPk(cmd.eventId)
  if (!row) return refuse('not_found')
  if (row.appliedAt !== null || row.payload === null)
    return ok({ outcome: row.outcome ?? 'cut', refreshAccount: null })
  crashPoint('event_before_apply')
  const read = readEvent(JSON.stringify(row.payload))
  const applied: Result<string, 'provider_unreachable'> = read.ok
    ? await apply(row, read.value.change, cmd.now)
    : ok('unreadable')
  if (!applied.ok) return applied
  await row.update({ appliedAt: cmd.now, outcome: applied.value })
  crashPoint('event_applied')
  const isAboutAccount = read.ok && ['account_changed', 'account_lost'].includes(read.value.change.kind)
  return ok({ outcome: applied.value, refreshAccount: isAboutAccount ? row.account : null })
}

async function apply(
  event: ProviderEvent,
  change: ProviderChange,
  now: Date,
): Promise<Result<string, 'provider_unreachable'>> {
  const { account, id: eventId } = event
  switch (change.kind) {
    case 'checkout_completed':
    case 'checkout_expired':
    case 'payment_captured':
    case 'payment_needs_customer':
    case 'payment_failed':
    case 'payment_cancelled':
    case 'fee_known': {
      const attemptId = await attemptOfChange(account, change)
      if (attemptId === null) return ok('not_ours')
      const settled = await settle(attemptId, { now, eventId })
      if (settled.ok) return ok(settled.value.attempt.state)
      return settled.reason === 'not_found' ? ok('not_ours') : refuse('provider_unreachable')
    }
    case 'refund_changed':
      return ok(await recordRefundNews(account, change, now))
    case 'dispute_changed':
      return ok(await recordDispute(account, change, now))
    case 'account_changed':
    case 'account_lost':
      return ok('account')
    case 'payout_changed':
      return ok(await recordPayout(account, change, now))
    case 'ignored':
      return ok('ignored')
  }
}
