import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import type { AttemptState } from '@/lib/core/states/attempt'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, money, optional, preset, ref, table, text, whole } from './columns'
import type { Order } from './order'
import type { Refund } from './refund'
import type { AttemptMethod } from './words'

/** One call for money at the provider. */
export class PaymentAttempt extends Model<
  InferAttributes<PaymentAttempt>,
  InferCreationAttributes<PaymentAttempt>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The order it pays. */
  declare orderId: string
  /** deposit, balance, or change-n. */
  declare purpose: string
  /** 1, 2, … within (order, purpose); rises only after a definite failure. */
  declare sequence: number
  /** Hosted checkout, or the saved card without the buyer. */
  declare method: AttemptMethod
  /** Sum asked for, minor units. */
  declare amountMinor: Minor
  /** Its currency. */
  declare currency: string
  /** {purpose}:{order}:{sequence}; sent with the call and every repeat of it. */
  declare idempotencyKey: string
  /** SHA-256 of the parameters of the call, hex: a repeat sends the very same. */
  declare paramsHash: string
  /** The parameters themselves, ids and sums only. */
  declare params: Record<string, unknown>
  /** Connected account it is charged on. */
  declare providerAccountId: string
  /** The provider's id of the payment; null until answered. */
  declare providerId: string | null
  /** The provider's id of the card session; null for saved cards and until answered. */
  declare providerSessionId: string | null
  /** The provider's id of the successful charge; null until captured. */
  declare chargeId: string | null
  /** Address of the card page; null for saved cards and until answered. */
  declare payUrl: string | null
  /** When the card session ends at the provider. */
  declare sessionExpiresAt: Date | null
  /** Where it stands (states.md, attempt). */
  declare state: CreationOptional<AttemptState>
  /** The provider's code for the last failure; null if none. */
  declare failureCode: string | null
  /** The provider's fee for it; null until known. */
  declare feeMinor: Minor | null
  /** When the row was written, before the call (business time). */
  declare requestedAt: Date
  /** When the provider answered. */
  declare sentAt: Date | null
  /** When it was captured, failed or abandoned. */
  declare endedAt: Date | null
  /** When a late capture was found to be one too many; it is paid back in full. Null normally. */
  declare surplusAt: Date | null

  declare order?: NonAttribute<Order>
  declare refunds?: NonAttribute<Refund[]>

  facts() {
    return {
      id: this.id,
      orderId: this.orderId,
      purpose: this.purpose,
      sequence: this.sequence,
      method: this.method,
      amountMinor: this.amountMinor,
      currency: this.currency,
      state: this.state,
      sessionExpiresAt: this.sessionExpiresAt,
      surplusAt: this.surplusAt,
    }
  }
}

PaymentAttempt.init(
  {
    id: key(),
    workshopId: ref(),
    orderId: ref(),
    purpose: text(),
    sequence: whole(),
    method: text(),
    amountMinor: money(),
    currency: text(),
    idempotencyKey: text(),
    paramsHash: text(),
    params: json(),
    providerAccountId: text(),
    providerId: optional(text()),
    providerSessionId: optional(text()),
    chargeId: optional(text()),
    payUrl: optional(text()),
    sessionExpiresAt: optional(moment()),
    state: preset(text(), 'requested'),
    failureCode: optional(text()),
    feeMinor: optional(money()),
    requestedAt: moment(),
    sentAt: optional(moment()),
    endedAt: optional(moment()),
    surplusAt: optional(moment()),
  },
  table(sequelize, 'PaymentAttempt', 'payment_attempts'),
)
