import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import type { RefundState } from '@/lib/core/states/refund'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, money, optional, preset, ref, table, text, whole } from './columns'
import type { Order } from './order'
import type { PaymentAttempt } from './payment-attempt'
import type { RefundCause } from './words'

/** One repayment of a captured attempt; a retry after a failure is a new row. */
export class Refund extends Model<InferAttributes<Refund>, InferCreationAttributes<Refund>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The payment it goes back on. */
  declare attemptId: string
  /** The order, for its page. */
  declare orderId: string
  /** 1, 2, … within the attempt. */
  declare sequence: number
  /** Sum paid back, minor units. */
  declare amountMinor: Minor
  /** Its currency. */
  declare currency: string
  /** Why. */
  declare cause: RefundCause
  /** The owner's words, told to the buyer; null where the cause says it all. */
  declare reason: string | null
  /** refund:{attempt}:{sequence}. */
  declare idempotencyKey: string
  /** The provider's id; null until answered. */
  declare providerId: string | null
  /** Where it stands (states.md, refund). */
  declare state: CreationOptional<RefundState>
  /** By how much the provider's balance was short when last tried; null if it was not. */
  declare shortByMinor: Minor | null
  /** The provider's code for a failure; null if none. */
  declare failureCode: string | null
  /** The failed repayment this one repeats; null for a first try. */
  declare retryOfId: string | null
  /** Who asked for it; null when the system did. */
  declare requestedByPersonId: string | null
  /** When the row was written (business time). */
  declare requestedAt: Date
  /** When the provider answered. */
  declare sentAt: Date | null
  /** When it had gone through; stays when it fails later. */
  declare succeededAt: Date | null
  /** When it failed. */
  declare failedAt: Date | null

  declare order?: NonAttribute<Order>
  declare attempt?: NonAttribute<PaymentAttempt>

  facts() {
    return {
      id: this.id,
      attemptId: this.attemptId,
      amountMinor: this.amountMinor,
      currency: this.currency,
      state: this.state,
      shortByMinor: this.shortByMinor,
    }
  }
}

Refund.init(
  {
    id: key(),
    workshopId: ref(),
    attemptId: ref(),
    orderId: ref(),
    sequence: whole(),
    amountMinor: money(),
    currency: text(),
    cause: text(),
    reason: optional(text()),
    idempotencyKey: text(),
    providerId: optional(text()),
    state: preset(text(), 'requested'),
    shortByMinor: optional(money()),
    failureCode: optional(text()),
    retryOfId: optional(ref()),
    requestedByPersonId: optional(ref()),
    requestedAt: moment(),
    sentAt: optional(moment()),
    succeededAt: optional(moment()),
    failedAt: optional(moment()),
  },
  table(sequelize, 'Refund', 'refunds'),
)
