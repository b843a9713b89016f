import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import type { TaxMode } from '@/lib/core/orders/tax-rate'
import type { OrderState } from '@/lib/core/states/order'
import { sequelize } from '@/lib/db/sequelize'
import {
  bigWhole,
  flag,
  json,
  key,
  moment,
  money,
  optional,
  preset,
  ref,
  table,
  text,
  whole,
} from './columns'
import type { Address } from './address'
import type { Dispute } from './dispute'
import type { Invoice } from './invoice'
import type { PostageQuote } from './json'
import type { NoticeAnswer } from './notice-answer'
import type { OrderChange } from './order-change'
import type { OrderLine } from './order-line'
import type { PaymentAttempt } from './payment-attempt'
import type { Person } from './person'
import type { Problem } from './problem'
import type { Refund } from './refund'
import type { Run } from './run'
import type { TermsVersion } from './terms-version'
import type { CancelCause, OrderKind } from './words'
import type { Workshop } from './workshop'

/** A customer's place in a run. All sums are fixed when it is placed. */
export class Order extends Model<InferAttributes<Order>, InferCreationAttributes<Order>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Counts up from 1 within the workshop; what people quote. */
  declare number: number
  /** The run. */
  declare runId: string
  /** Whose order it is. */
  declare personId: string
  /** Paid here, or entered by the owner (paid elsewhere or free). */
  declare kind: CreationOptional<OrderKind>
  /** Where it stands (states.md, order). */
  declare state: OrderState
  /** Units in all lines together: the places it takes. */
  declare unitCount: number
  /** Order of arrival in the waiting list; null if it never waited. */
  declare queueNo: number | null
  /** Until when a place is held unpaid; null when nothing is held. */
  declare holdUntil: Date | null
  /** How often a place was held for it (first hold and every offered place). */
  declare holdAttempts: CreationOptional<number>
  /** When a freed place was last offered to it; null if never. */
  declare placeOfferedAt: Date | null
  /** When it was placed (business time). */
  declare placedAt: Date
  /** Terms it was placed under; null for manual orders. */
  declare termsVersionId: string | null
  /** Where it goes; null for manual orders handed over in person. */
  declare addressId: string | null
  /** Fingerprint of that address, for the rule of one live order per run, person and address. */
  declare addressFingerprint: string | null
  /** Country it is taxed and posted to. */
  declare country: string
  /** Currency of every sum of this order. */
  declare currency: string
  /** Tax mode as it was when placed. */
  declare taxMode: TaxMode
  /** Whether prices were entered with tax when it was placed. */
  declare pricesIncludeTax: boolean
  /** Lines together, tax in. */
  declare goodsMinor: Minor
  /** Postage the buyer pays, tax in. */
  declare postageMinor: Minor
  /** Zone, service and weight the postage was quoted from; null without postage. */
  declare postageQuote: PostageQuote | null
  /** Rate of tax on postage. */
  declare postageTaxBasisPoints: CreationOptional<number>
  /** Tax in the postage. */
  declare postageTaxMinor: CreationOptional<Minor>
  /** Tax of lines and postage together. */
  declare taxMinor: Minor
  /** Everything the buyer pays, tax in. */
  declare totalMinor: Minor
  /** Of it, paid first. */
  declare depositMinor: Minor
  /** Of it, paid when balances fall due. */
  declare balanceMinor: Minor
  /** Why the owner entered it; null for paid ones. */
  declare manualReason: string | null
  /** Who entered it; null for paid ones. */
  declare enteredByPersonId: string | null
  /** When its balance was announced. */
  declare balanceAskedAt: Date | null
  /** When the saved card is charged, 7 days after the announcement. */
  declare balanceChargeAt: Date | null
  /** When the first charge of the balance failed: reminders and lapse count from here. */
  declare balanceFailedAt: Date | null
  /** When it was paid in full. */
  declare paidAt: Date | null
  /** When its last line was packed; null again after unpacking. */
  declare packedAt: Date | null
  /** When the buyer's bank opened a dispute; null when none is open. Blocks packing, lapse and refund. */
  declare disputedAt: Date | null
  /** When it was cancelled, by either side. */
  declare cancelledAt: Date | null
  /** What cancelled it. */
  declare cancelCause: CancelCause | null
  /** The owner's reason, told to the buyer; null where none was needed. */
  declare cancelReason: string | null
  /** When its hold ended unpaid. */
  declare expiredAt: Date | null
  /** When it lapsed over its balance. */
  declare lapsedAt: Date | null
  /** When its last parcel was handed over. */
  declare postedAt: Date | null
  /** When the last piece arrived, as far as known; starts the withdrawal period. */
  declare deliveredAt: Date | null
  /** When the buyer withdrew by right after posting. */
  declare withdrawnAt: Date | null
  /** When the goods came back. */
  declare returnedAt: Date | null

  declare run?: NonAttribute<Run>
  declare termsVersion?: NonAttribute<TermsVersion>
  declare workshop?: NonAttribute<Workshop>
  declare person?: NonAttribute<Person>
  declare address?: NonAttribute<Address>
  declare lines?: NonAttribute<OrderLine[]>
  declare changes?: NonAttribute<OrderChange[]>
  declare attempts?: NonAttribute<PaymentAttempt[]>
  declare refunds?: NonAttribute<Refund[]>
  declare invoices?: NonAttribute<Invoice[]>
  declare problems?: NonAttribute<Problem[]>
  declare disputes?: NonAttribute<Dispute[]>
  declare noticeAnswers?: NonAttribute<NoticeAnswer[]>

  facts() {
    return {
      id: this.id,
      runId: this.runId,
      personId: this.personId,
      kind: this.kind,
      state: this.state,
      unitCount: this.unitCount,
      queueNo: this.queueNo,
      holdUntil: this.holdUntil,
      currency: this.currency,
      country: this.country,
      totalMinor: this.totalMinor,
      depositMinor: this.depositMinor,
      balanceMinor: this.balanceMinor,
      balanceAskedAt: this.balanceAskedAt,
      balanceChargeAt: this.balanceChargeAt,
      balanceFailedAt: this.balanceFailedAt,
      disputedAt: this.disputedAt,
      postedAt: this.postedAt,
      deliveredAt: this.deliveredAt,
    }
  }
}

Order.init(
  {
    id: key(),
    workshopId: ref(),
    number: whole(),
    runId: ref(),
    personId: ref(),
    kind: preset(text(), 'paid'),
    state: text(),
    unitCount: whole(),
    queueNo: optional(bigWhole()),
    holdUntil: optional(moment()),
    holdAttempts: preset(whole(), 0),
    placeOfferedAt: optional(moment()),
    placedAt: moment(),
    termsVersionId: optional(ref()),
    addressId: optional(ref()),
    addressFingerprint: optional(text()),
    country: text(),
    currency: text(),
    taxMode: text(),
    pricesIncludeTax: flag(),
    goodsMinor: money(),
    postageMinor: money(),
    postageQuote: optional(json()),
    postageTaxBasisPoints: preset(whole(), 0),
    postageTaxMinor: preset(money(), 0),
    taxMinor: money(),
    totalMinor: money(),
    depositMinor: money(),
    balanceMinor: money(),
    manualReason: optional(text()),
    enteredByPersonId: optional(ref()),
    balanceAskedAt: optional(moment()),
    balanceChargeAt: optional(moment()),
    balanceFailedAt: optional(moment()),
    paidAt: optional(moment()),
    packedAt: optional(moment()),
    disputedAt: optional(moment()),
    cancelledAt: optional(moment()),
    cancelCause: optional(text()),
    cancelReason: optional(text()),
    expiredAt: optional(moment()),
    lapsedAt: optional(moment()),
    postedAt: optional(moment()),
    deliveredAt: optional(moment()),
    withdrawnAt: optional(moment()),
    returnedAt: optional(moment()),
  },
  table(sequelize, 'Order', 'orders'),
)
