import 'server-only'
import Stripe from 'stripe'
import { ok, refuse, type Result } from '@/lib/core/result'
import type { ChangeReason, LookupReason } from '@/lib/gateways/payments/types'

const REASON_OF_CODE: Readonly<Record<string, ChangeReason>> = {
  charge_already_refunded: 'more_than_charged',
  balance_insufficient: 'insufficient_balance',
  insufficient_funds: 'insufficient_balance',
  resource_missing: 'not_found',
  payment_intent_unexpected_state: 'wrong_state',
  charge_disputed: 'wrong_state',
  charge_expired_for_capture: 'wrong_state',
  account_invalid: 'not_allowed',
  account_closed: 'not_allowed',
  platform_api_key_expired: 'not_allowed',
  amount_too_small: 'below_minimum',
  amount_too_large: 'above_maximum',
  lock_timeout: 'unknown_outcome',
  idempotency_key_in_use: 'unknown_outcome',
}

/** Reasons for a refused parameter where the provider gives no code of its own. */
type ReasonOfParam = Readonly<Record<string, ChangeReason>>

/** What an error of the SDK says about a change; anything that is not the provider's is a bug and thrown on. */
function changeReason(error: unknown, byParam: ReasonOfParam): ChangeReason {
  if (!(error instanceof Stripe.errors.StripeError)) throw error
  // The fake met something it does not model: a hole in the fake must not pass for a lost connection.
  if (error.detail instanceof Error && error.detail.name === 'SandboxBug') throw error.detail
  const byCode = error.code === undefined ? undefined : REASON_OF_CODE[error.code]
  if (byCode !== undefined) return byCode
  const ofParam = error.param === undefined ? undefined : byParam[error.param]
  if (ofParam !== undefined) return ofParam
  if (error instanceof Stripe.errors.StripeIdempotencyError) return 'key_reused'
  if (error instanceof Stripe.errors.StripeRateLimitError) return 'rate_limited'
  if (error instanceof Stripe.errors.StripeAuthenticationError) return 'not_allowed'
  if (error instanceof Stripe.errors.StripePermissionError) return 'not_allowed'
  if (error instanceof Stripe.errors.StripeInvalidRequestError)
    return error.statusCode === 404 ? 'not_found' : 'invalid'
  if (error instanceof Stripe.errors.StripeCardError) return 'invalid'
  // Connection lost, time limit, 5xx, an unreadable body: the request may have been carried out.
  return 'unknown_outcome'
}

const LOOKUP_REASONS: readonly ChangeReason[] = ['rate_limited', 'not_found', 'not_allowed', 'invalid']

/**
 * Runs one change at the provider and turns its errors into reasons.
 * Throws what the SDK did not make: that is a bug of ours.
 */
export async function changed<T>(
  call: () => Promise<T>,
  byParam: ReasonOfParam = {},
): Promise<Result<T, ChangeReason>> {
  try {
    return ok(await call())
  } catch (error) {
    return refuse(changeReason(error, byParam))
  }
}

/** The same for a look-up, where a lost answer only means: ask again. */
export async function found<T>(call: () => Promise<T>): Promise<Result<T, LookupReason>> {
  try {
    return ok(await call())
  } catch (error) {
    const reason = changeReason(error, {})
    return refuse(LOOKUP_REASONS.includes(reason) ? (reason as LookupReason) : 'unavailable')
  }
}
