import type Stripe from 'stripe'

/** Something the fake does not model, or a mistake in it: never to be taken for the world's doing. */
export class SandboxBug extends Error {
  override name = 'SandboxBug'
}

/** The published shape of an error. */
export type ErrorBody = {
  type: 'card_error' | 'invalid_request_error' | 'idempotency_error' | 'api_error' | 'rate_limit_error'
  message: string
  code?: string
  decline_code?: string
  param?: string
  charge?: string
  payment_intent?: Stripe.PaymentIntent
  payment_method?: Stripe.PaymentMethod
}

/**
 * An answer that is an error. `keeps`: 'nothing' for a request refused before it began (its key stays free),
 * 'answer' for one that ran and failed (a repeat with the key gets the same), 'effects' when it also left traces.
 */
export class ProviderRefusal extends Error {
  constructor(
    readonly status: number,
    readonly body: ErrorBody,
    readonly keeps: 'nothing' | 'answer' | 'effects',
  ) {
    super(body.message)
  }
}

/** A parameter that cannot be; nothing was begun. */
export function invalid(message: string, param?: string, code?: string): ProviderRefusal {
  const body: ErrorBody = { type: 'invalid_request_error', message }
  if (param !== undefined) body.param = param
  if (code !== undefined) body.code = code
  return new ProviderRefusal(400, body, 'nothing')
}

/** The provider’s 404. */
export function missing(kind: string, id: string): ProviderRefusal {
  const message = `No such ${kind.replaceAll('_', ' ')}: '${id}'`
  return new ProviderRefusal(
    404,
    { type: 'invalid_request_error', code: 'resource_missing', message, param: 'id' },
    'nothing',
  )
}

/** The object is past this. */
export function unexpected(code: string, message: string): ProviderRefusal {
  return new ProviderRefusal(400, { type: 'invalid_request_error', code, message }, 'answer')
}

/** The card was refused (HTTP 402); charge and payment tell of the try. */
export function cardError(body: Omit<ErrorBody, 'type'>): ProviderRefusal {
  return new ProviderRefusal(402, { type: 'card_error', ...body }, 'effects')
}
