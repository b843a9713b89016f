import type {
  AccountFacts,
  DisputeFacts,
  PaymentPurpose,
  RefundFacts,
  CardFailure,
} from '@/lib/gateways/payments/types'
import type { Minor } from '@/lib/core/brand'

/** Ids and sums of a payment as an event tells them. The newest truth is `getPayment`. */
export type PaymentNews = {
  readonly payment: string
  readonly charge: string | null
  readonly customer: string | null
  readonly method: string | null
  readonly amount: Minor
  readonly currency: string
  readonly about: PaymentPurpose | null
}

/**
 * What an event of the provider says, in our words. One change can arrive as two events (checkout_completed and
 * payment_captured), late, twice or out of order, so an effect is unique on (object, transition), not on the event.
 */
export type ProviderChange =
  /** The card page was finished. `paid` false: the money is still on its way, wait for payment_captured. */
  | {
      readonly kind: 'checkout_completed'
      readonly session: string
      readonly paid: boolean
      readonly payment: string | null
      readonly customer: string | null
      readonly amount: Minor
      readonly currency: string
      readonly about: PaymentPurpose | null
    }
  /** The session can never be paid any more. */
  | { readonly kind: 'checkout_expired'; readonly session: string; readonly about: PaymentPurpose | null }
  | ({ readonly kind: 'payment_captured' } & PaymentNews)
  | ({ readonly kind: 'payment_needs_customer' } & PaymentNews)
  | ({ readonly kind: 'payment_failed'; readonly failure: CardFailure } & PaymentNews)
  | ({ readonly kind: 'payment_cancelled' } & PaymentNews)
  /** The provider's fee of this payment can be read now (`getPayment`). */
  | { readonly kind: 'fee_known'; readonly payment: string; readonly charge: string }
  | ({ readonly kind: 'refund_changed' } & RefundFacts)
  | ({ readonly kind: 'dispute_changed' } & DisputeFacts)
  | ({ readonly kind: 'account_changed' } & Omit<AccountFacts, 'payoutSchedule'>)
  | { readonly kind: 'account_lost' }
  | {
      readonly kind: 'payout_changed'
      readonly payout: string
      readonly state: 'pending' | 'paid' | 'failed'
      readonly amount: Minor
      readonly currency: string
    }
  /** Nothing we act on. */
  | { readonly kind: 'ignored' }

/** A verified webhook: unique on (account, eventId). */
export type ProviderEvent = {
  readonly eventId: string
  /** The connected account; '' for an event of the platform itself. */
  readonly account: string
  /** The provider's own name, such as 'payment_intent.succeeded'. */
  readonly type: string
  readonly objectId: string
  /** When it happened at the provider; says nothing about the order of arrival. */
  readonly happenedAt: Date
  readonly livemode: boolean
  readonly change: ProviderChange
  /** The event as sent, to be stored; parse again with `readEvent`. */
  readonly raw: string
}
