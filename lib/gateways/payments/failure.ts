import 'server-only'
import type { CardFailure, FailureCode } from '@/lib/gateways/payments/types'

/** Source: the provider's published lists of error codes and decline codes, from memory. */
const OURS: Readonly<Record<string, FailureCode>> = {
  insufficient_funds: 'insufficient_funds',
  withdrawal_count_limit_exceeded: 'insufficient_funds',
  card_velocity_exceeded: 'insufficient_funds',
  expired_card: 'expired_card',
  invalid_expiry_month: 'incorrect_details',
  invalid_expiry_year: 'incorrect_details',
  incorrect_number: 'incorrect_details',
  invalid_number: 'incorrect_details',
  incorrect_cvc: 'incorrect_details',
  invalid_cvc: 'incorrect_details',
  incorrect_zip: 'incorrect_details',
  lost_card: 'card_not_usable',
  stolen_card: 'card_not_usable',
  pickup_card: 'card_not_usable',
  restricted_card: 'card_not_usable',
  card_not_supported: 'card_not_usable',
  currency_not_supported: 'card_not_usable',
  authentication_required: 'authentication_failed',
  payment_intent_authentication_failure: 'authentication_failed',
  processing_error: 'try_again_later',
  issuer_not_available: 'try_again_later',
  try_again_later: 'try_again_later',
  reenter_transaction: 'try_again_later',
}

/** A refused card in our words; the decline code says more than the error code, so it goes first. */
export function cardFailure(error: {
  code?: string | null | undefined
  decline_code?: string | null | undefined
  message?: string | null | undefined
}): CardFailure {
  const providerCode = error.decline_code ?? error.code ?? null
  const known = OURS[error.decline_code ?? ''] ?? OURS[error.code ?? '']
  return { code: known ?? 'declined', providerCode, words: error.message ?? '' }
}

/** True when the bank refused only because the buyer was absent, so that the same payment can be finished. */
export function asksForCustomer(error: { code?: string | null; decline_code?: string | null }): boolean {
  return error.code === 'authentication_required' || error.decline_code === 'authentication_required'
}
