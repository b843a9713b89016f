import 'server-only'
import { payments } from '@/lib/gateways/payments'
import type { Window } from '@/lib/gateways/payments/types'
import { recordDispute } from '@/lib/services/_steps/record-dispute'
import { Dispute } from '@/models'

/**
 * Asks the provider about every dispute it lists and every one still open here, and writes down how each stands: events
 * about them may have been lost. False when the provider did not answer.
 * For services, outside any transaction. Locks: run and order of each. Writes: as `recordDispute`. Repeat: safe.
 */
export async function catchUpDisputes(workshopId: string, window: Window, now: Date): Promise<boolean> {
  const listed = await payments().listDisputes(window)
  if (!listed.ok) return false
  const open = await Dispute.findAll({ where: { workshopId, state: 'open' }, attributes: ['providerId'] })
  const ids = new Set([...listed.value.map(({ id }) => id), ...open.map(({ providerId }) => providerId)])
  for (const dispute of ids) {
    const found = await payments().getDispute({ account: window.account, dispute })
    if (found.ok) await recordDispute(window.account, found.value, now)
    else if (found.reason !== 'not_found') return false
  }
  return true
}
