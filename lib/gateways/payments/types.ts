import type { Minor } from '@/lib/core/brand'
import type { Result } from '@/lib/core/result'
import type { ProviderEvent } from '@/lib/gateways/payments/changes'

/** The provider's id of a workshop's account (`acct_…`); every call but `createAccount` is made on one. */
export type AccountId = string

/**
 * Why a change at the provider has no answer.
 *
 * `unknown_outcome`: time limit, 5xx or a lost connection after the request went out; it may have happened.
 * Only an event or a look-up (`findAttempt`, `findRefund`, `getCheckout`, …) ends it; never a new key.
 * `rate_limited`: certainly not done; the same key may be sent again later.
 * `insufficient_balance`: a refund the account's balance does not cover.
 * `more_than_charged`: a refund above what is left of the payment, or of one already paid back.
 * `not_found`: no such object on this account. `invalid`: the provider refuses the request as it stands.
 * `wrong_state`: the object is past this (a cancelled payment confirmed, a finished one cancelled).
 * `key_reused`: this key was sent before with other parameters (a bug of ours, never repeated).
 * `not_allowed`: our key or the account may not do this (not onboarded, suspended, revoked).
 * `below_minimum`, `above_maximum`, `not_representable`: the provider cannot charge this amount.
 */
export type ChangeReason =
  | 'unknown_outcome'
  | 'rate_limited'
  | 'insufficient_balance'
  | 'more_than_charged'
  | 'not_found'
  | 'invalid'
  | 'wrong_state'
  | 'key_reused'
  | 'not_allowed'
  | 'below_minimum'
  | 'above_maximum'
  | 'not_representable'

/** Why a look-up has no answer; `unavailable` says nothing about the object: ask again. */
export type LookupReason = 'unavailable' | 'rate_limited' | 'not_found' | 'not_allowed' | 'invalid'

/** Which of an order's payments: 'deposit', 'balance', or 'change-1', 'change-2', … for a changed order. */
export type Purpose = 'deposit' | 'balance' | `change-${number}`

/** What is known of a workshop's account at the provider. */
export type AccountFacts = {
  readonly account: AccountId
  /** Cards may be charged; false until onboarding is finished. */
  readonly chargesEnabled: boolean
  readonly payoutsEnabled: boolean
  readonly detailsSubmitted: boolean
  /** 'manual' keeps everything in the balance until a payout is asked for. */
  readonly payoutSchedule: 'manual' | 'automatic'
  readonly country: string | null
  /** ISO 4217, upper case. */
  readonly currency: string | null
}

/** The buyer and the words of a payment; a metadata triple ties it to the order and the attempt row. */
export type PaymentPurpose = {
  readonly orderId: string
  readonly attemptId: string
  readonly purpose: Purpose
}

/** A card session as the provider has it. */
export type CheckoutFacts = {
  readonly sessionId: string
  /** open: may still be paid · complete: handed in (see `payment`) · expired: can never be paid any more. */
  readonly state: 'open' | 'complete' | 'expired'
  /** Where the buyer pays; null unless open. */
  readonly url: string | null
  readonly expiresAt: Date
  readonly amount: Minor
  readonly currency: string
  readonly about: PaymentPurpose | null
  readonly payment: PaymentFacts | null
}

/** A refused card: the provider's code, our narrower code, and the provider's English sentence. */
export type CardFailure = {
  readonly code: FailureCode
  readonly providerCode: string | null
  readonly words: string
}

/** Ours, so that the interface can word each; anything else is 'declined'. */
export type FailureCode =
  | 'insufficient_funds'
  | 'expired_card'
  | 'card_not_usable'
  | 'incorrect_details'
  | 'authentication_failed'
  | 'try_again_later'
  | 'declined'

/** One payment (at the provider a payment intent with its latest charge). */
export type PaymentFacts = {
  readonly payment: string
  /**
   * open: nothing tried yet · needs_customer: the bank wants the buyer, `finishPayment` gives the link ·
   * processing: wait · failed: the last try was refused, the payment can still be finished or cancelled ·
   * captured · cancelled: can never be captured any more.
   */
  readonly state: 'open' | 'needs_customer' | 'processing' | 'failed' | 'captured' | 'cancelled'
  readonly amount: Minor
  readonly currency: string
  readonly capturedAmount: Minor
  readonly refundedAmount: Minor
  readonly customer: string | null
  /** The payment method used; on a deposit with `saveCard` the one to charge for the balance. */
  readonly method: string | null
  readonly card: { readonly brand: string; readonly last4: string; readonly country: string | null } | null
  readonly charge: string | null
  /** The provider's fee, in `feeCurrency`; null while the provider has not said (ask again). */
  readonly fee: Minor | null
  readonly feeCurrency: string | null
  readonly failure: CardFailure | null
  readonly about: PaymentPurpose | null
  readonly disputed: boolean
  readonly createdAt: Date
}

/** The answer to charging a saved card: never an error when the card or the bank says no. */
export type ChargeOutcome =
  | { readonly state: 'captured'; readonly payment: PaymentFacts }
  | { readonly state: 'needs_customer'; readonly payment: PaymentFacts }
  | { readonly state: 'processing'; readonly payment: PaymentFacts }
  | { readonly state: 'failed'; readonly payment: PaymentFacts; readonly failure: CardFailure }

/** The answer to `finishPayment`: where the buyer goes, or that nothing is left to do. */
export type FinishOutcome =
  ChargeOutcome | { readonly state: 'go'; readonly url: string; readonly payment: PaymentFacts }

/** A refund as the provider has it. */
export type RefundFacts = {
  readonly id: string
  readonly state: 'pending' | 'succeeded' | 'failed'
  readonly amount: Minor
  readonly currency: string
  readonly payment: string | null
  readonly charge: string | null
  /** metadata.refund: our refund row. */
  readonly refundId: string | null
  /** Why it failed or waits, in the provider's words. */
  readonly failure: string | null
  readonly createdAt: Date
}

/** A dispute as the provider has it; while it is open or lost the charge cannot be refunded. */
export type DisputeFacts = {
  readonly id: string
  readonly state: 'needs_response' | 'under_review' | 'won' | 'lost' | 'closed'
  readonly reason: string
  readonly amount: Minor
  readonly currency: string
  readonly payment: string | null
  readonly charge: string
  /** True once the provider has withheld the amount; an inquiry alone withholds nothing. */
  readonly isWithheld: boolean
  /** What the provider charges for it, so far. */
  readonly fee: Minor
  readonly answerBy: Date | null
  readonly createdAt: Date
}

/** What lies on the account, by currency. */
export type BalanceFacts = {
  /** May be paid out or refunded now. */
  readonly available: readonly { readonly currency: string; readonly amount: Minor }[]
  /** On its way. A refund may use it too. */
  readonly pending: readonly { readonly currency: string; readonly amount: Minor }[]
}

/**
 * One line of the provider's own books, in the shape `reconcile` of lib/core/ledger takes.
 * charge: amount captured · refund: amount sent back (a failed one is left out) · dispute: amount withheld
 * (won ones left out) · fee: id is the balance transaction's · payout: amount sent to the bank (failed left out).
 */
export type BookLine = {
  readonly id: string
  readonly kind: 'charge' | 'refund' | 'dispute' | 'fee' | 'payout'
  readonly amount: Minor
  readonly currency: string
  readonly at: Date
  /** The payment it belongs to; null for payouts and account fees. */
  readonly payment: string | null
}

/** from ≤ created < to, in whole seconds of the provider’s clock. */
export type Window = { readonly account: AccountId; readonly from: Date; readonly to: Date }

/** Evidence for a dispute, as far as the order holds it. Texts ≤ 20,000 characters each. */
export type DisputeEvidence = {
  readonly customerName?: string
  readonly customerEmail?: string
  readonly productDescription?: string
  readonly shippingAddress?: string
  readonly shippingCarrier?: string
  readonly shippingDate?: string
  readonly shippingTracking?: string
  readonly refundPolicy?: string
  readonly notes?: string
}

/** The answer of a change. */
export type Changed<T> = Promise<Result<T, ChangeReason>>
/** The answer of a look-up. */
export type Found<T> = Promise<Result<T, LookupReason>>

/**
 * The payment provider, on connected accounts (direct charges).
 *
 * Time limit 10 s a try; the SDK repeats a lost connection, 409 and 5xx twice with the same key.
 * `key` is the caller's stored idempotency key. Nothing here throws for what the world does: only for a
 * caller's mistake. Money is our minor units; the provider's own decimals stay inside.
 * The fake differs: see fake/README.md.
 */
export type Payments = {
  /** True while the fake answers. */
  readonly isFake: boolean

  createAccount(args: {
    key: string
    workshopId: string
    country: string
    currency: string
    email: string
    name: string
  }): Changed<{ account: AccountId }>
  /** A link to the provider's own forms, good once and for minutes: make it when the owner presses the button. */
  onboardingLink(args: {
    account: AccountId
    returnUrl: string
    refreshUrl: string
  }): Changed<{ url: string; expiresAt: Date }>
  getAccount(args: { account: AccountId }): Found<AccountFacts>
  setManualPayouts(args: { account: AccountId; key: string }): Changed<{ payoutSchedule: 'manual' }>
  setAutomaticPayouts(args: { account: AccountId; key: string }): Changed<{ payoutSchedule: 'automatic' }>

  /** The customer of this person on this account, found by metadata.person or made. */
  ensureCustomer(args: {
    account: AccountId
    key: string
    personId: string
    email: string
    name?: string
  }): Changed<{ customer: string }>

  /**
   * A hosted card session. `expiresAt` 30 min to 24 h from now (give 31 min). `saveCard` asks the buyer to agree
   * that the card is charged later. The success URL may hold `{CHECKOUT_SESSION_ID}`.
   */
  createCheckout(
    args: PaymentPurpose & {
      account: AccountId
      key: string
      amount: Minor
      currency: string
      customer: string
      description: string
      saveCard: boolean
      successUrl: string
      cancelUrl: string
      expiresAt: Date
    },
  ): Changed<{ sessionId: string; url: string; expiresAt: Date }>
  getCheckout(args: { account: AccountId; sessionId: string }): Found<CheckoutFacts>
  /** Ends an open session. Answers what the session is afterwards: 'complete' when the buyer was faster. */
  expireCheckout(args: { account: AccountId; key: string; sessionId: string }): Changed<CheckoutFacts>

  /** Charges the saved method with the buyer absent. */
  chargeSavedCard(
    args: PaymentPurpose & {
      account: AccountId
      key: string
      customer: string
      method: string
      amount: Minor
      currency: string
      description: string
    },
  ): Changed<ChargeOutcome>
  /**
   * The link with which the buyer finishes this same payment: the bank's page for the card that was tried (or for
   * `method`), then back to `returnUrl`. Each press is one call with a key of its own. For another card or method:
   * `cancelPayment`, then `createCheckout` under the next sequence.
   */
  finishPayment(args: {
    account: AccountId
    key: string
    payment: string
    method?: string
    returnUrl: string
  }): Changed<FinishOutcome>
  /** Makes sure a payment can never be captured any more. Answers its state: 'captured' when it was too late. */
  cancelPayment(args: { account: AccountId; key: string; payment: string }): Changed<PaymentFacts>
  getPayment(args: { account: AccountId; payment: string }): Found<PaymentFacts>
  /** The last digits of the saved method, for "card ending …". */
  getMethod(args: {
    account: AccountId
    customer: string
    method: string
  }): Found<{ brand: string; last4: string; expires: string }>

  refund(args: {
    account: AccountId
    key: string
    payment: string
    amount: Minor
    currency: string
    refundId: string
  }): Changed<RefundFacts>
  getRefund(args: { account: AccountId; refund: string }): Found<RefundFacts>

  /**
   * What the provider has for an attempt whose answer was lost, by customer and metadata.attempt.
   * `not_found` is final only when the request can no longer be under way: ≥ 60 s after it was sent.
   */
  findAttempt(args: {
    account: AccountId
    customer: string
    attemptId: string
  }): Found<
    | { readonly kind: 'checkout'; readonly checkout: CheckoutFacts }
    | { readonly kind: 'payment'; readonly payment: PaymentFacts }
  >
  /** The same for a refund, by payment and metadata.refund. */
  findRefund(args: { account: AccountId; payment: string; refundId: string }): Found<RefundFacts>

  balance(args: { account: AccountId }): Found<BalanceFacts>
  getDispute(args: { account: AccountId; dispute: string }): Found<DisputeFacts>
  sendEvidence(args: {
    account: AccountId
    key: string
    dispute: string
    evidence: DisputeEvidence
    submit: boolean
  }): Changed<DisputeFacts>

  /** Every page, oldest first; for the daily comparison. */
  listCharges(args: Window): Found<readonly BookLine[]>
  listRefunds(args: Window): Found<readonly BookLine[]>
  listDisputes(args: Window): Found<readonly BookLine[]>
  /** From the balance transactions: the fee of each charge and dispute, and the account's own fees. */
  listFees(args: Window): Found<readonly BookLine[]>
  listPayouts(args: Window): Found<readonly BookLine[]>

  /**
   * Checks a webhook's signature against each secret (newest first, so that they can be rotated) with a tolerance
   * of 300 s of real time, and reads it. `rawBody` is the body as it came.
   */
  verifyWebhook(
    rawBody: string,
    signatureHeader: string | null,
    secrets: readonly string[],
    now?: Date,
  ): Result<ProviderEvent, 'bad_signature' | 'too_old' | 'malformed'>
}
