import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { refuse } from '@/lib/core/result'
import { balanceAtProvider } from '@/lib/services/_steps/balance-at-provider'
import { Workshop } from '@/models'

/**
 * What lies on the workshop's account at the payment provider, minor units of its currency, within 2.5 s.
 * Refuses: forbidden · not_found · provider_unreachable. Locks, writes: nothing. Repeat: safe.
 */
export async function lookUpBalance(cmd: { actor: Actor; workshopId: string }) {
  const { actor, workshopId } = cmd
  if (!can(actor, 'run:read', { workshopId })) return refuse('forbidden')
  const workshop = await Workshop.findByPk(workshopId)
  if (!workshop) return refuse('not_found')
  return balanceAtProvider(workshop.providerAccountId, workshop.currency)
}
