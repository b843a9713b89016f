import 'server-only'
import { env } from '@/lib/config/env'
import { SANDBOX_KEY, stripeClient } from '@/lib/gateways/payments/client'
import { paymentsOver } from '@/lib/gateways/payments/live'
import type { Payments } from '@/lib/gateways/payments/types'

let made: Payments | undefined

/**
 * The payment gateway of this deployment; see `Payments` for time limits, repeats and reasons.
 * Without a key, in the sandbox, the fake answers through the same SDK.
 */
export function payments(): Payments {
  if (made !== undefined) return made
  const { SANDBOX, STRIPE_SECRET_KEY, STRIPE_API_BASE } = env()
  const secretKey = STRIPE_SECRET_KEY ?? (SANDBOX ? SANDBOX_KEY : undefined)
  if (secretKey === undefined) throw new Error('STRIPE_SECRET_KEY is missing while the sandbox is off')
  const isFake = secretKey === SANDBOX_KEY && STRIPE_API_BASE === undefined
  made = paymentsOver(stripeClient({ secretKey, apiBase: STRIPE_API_BASE }), { isFake })
  return made
}
