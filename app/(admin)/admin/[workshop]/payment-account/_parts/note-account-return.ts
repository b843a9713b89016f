import { refreshPaymentAccount } from '@/lib/services/workshops/refresh-payment-account'
import { businessNow } from '@/lib/http/business-now'

/**
 * The owner comes back here from the provider's forms, usually before the provider's event does: ask once, so that the
 * page says what is so. Asking changes nothing at the provider but the payout schedule, which is set once.
 */
export async function noteAccountReturn(account: string | null): Promise<boolean> {
  if (account === null) return false
  const facts = await refreshPaymentAccount({ account, now: await businessNow() })
  return facts.ok && facts.value.chargesEnabled
}
