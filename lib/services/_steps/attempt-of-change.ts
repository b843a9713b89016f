import 'server-only'
import type { ProviderChange } from '@/lib/gateways/payments/changes'
import { PaymentAttempt } from '@/models'

type PaymentChange = Extract<
  ProviderChange,
  {
    kind:
      | 'checkout_completed'
      | 'checkout_expired'
      | 'payment_captured'
      | 'payment_needs_customer'
      | 'payment_failed'
      | 'payment_cancelled'
      | 'fee_known'
  }
>

const UUID = /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/

/**
 * The attempt an event is about, by our own mark on the payment, else by the provider's ids; null when it is none of ours
 * or belongs to another account.
 */
export async function attemptOfChange(account: string, change: PaymentChange): Promise<string | null> {
  const marked = 'about' in change ? (change.about?.attemptId ?? null) : null
  const where =
    marked !== null && UUID.test(marked)
      ? { id: marked }
      : 'session' in change
        ? { providerSessionId: change.session }
        : { providerId: change.payment }
  const attempt = await PaymentAttempt.findOne({
    where: { ...where, providerAccountId: account },
    attributes: ['id'],
  })
  return attempt?.id ?? null
}
