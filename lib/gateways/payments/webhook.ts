import 'server-only'
import Stripe from 'stripe'
import { refuse } from '@/lib/core/result'
import { readEvent } from '@/lib/gateways/payments/read-event'
import type { Payments } from '@/lib/gateways/payments/types'

/** Real seconds a signature stays good. Source: the provider's recommendation, its SDK's default. */
const TOLERANCE_SECONDS = 300

type Check = 'good' | 'bad_signature' | 'too_old'

function check(rawBody: string, header: string, secret: string, now: Date): Check {
  try {
    Stripe.webhooks.signature?.verifyHeader(
      rawBody,
      header,
      secret,
      TOLERANCE_SECONDS,
      undefined,
      now.getTime(),
    )
  } catch (error) {
    // The SDK throws other errors too for some forged headers; whatever it throws, the signature is not good.
    const isOld =
      error instanceof Stripe.errors.StripeSignatureVerificationError && error.message.includes('tolerance')
    return isOld ? 'too_old' : 'bad_signature'
  }
  // The SDK accepts any time in the future; we hold both ways.
  const signedAt = Number(/(?:^|,)t=(\d+)/.exec(header)?.[1])
  return signedAt - now.getTime() / 1000 > TOLERANCE_SECONDS ? 'too_old' : 'good'
}

/**
 * Checks and reads one webhook; see `Payments.verifyWebhook`.
 * Real time is used whatever the business clock says. Never throws for what was sent.
 */
export const verifyWebhook: Payments['verifyWebhook'] = (
  rawBody,
  signatureHeader,
  secrets,
  now = new Date(),
) => {
  if (signatureHeader === null || signatureHeader === '' || rawBody === '') return refuse('bad_signature')
  const checks = secrets
    .filter((secret) => secret !== '')
    .map((secret) => check(rawBody, signatureHeader, secret, now))
  if (!checks.includes('good')) return refuse(checks.includes('too_old') ? 'too_old' : 'bad_signature')
  return readEvent(rawBody)
}
