import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day, Minor } from '@/lib/core/brand'
import type { PricedLine } from '@/lib/core/orders/totals'
import { sequelize } from '@/lib/db/sequelize'
import { day, json, key, money, optional, preset, ref, table, text, whole } from './columns'
import type { ChosenAnswer } from './json'
import type { Order } from './order'
import type { ParcelLine } from './parcel-line'
import type { RunOffer } from './run-offer'
import type { Unit } from './unit'
import type { OfferKind, TaxClass } from './words'

/** One offer in an order, with price, tax, choices and promise as they were when it was placed. */
export class OrderLine extends Model<InferAttributes<OrderLine>, InferCreationAttributes<OrderLine>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The order. */
  declare orderId: string
  /** What was ordered. */
  declare runOfferId: string
  /** Its form, copied. */
  declare offerKind: OfferKind
  /** Order in the order, from 0. */
  declare position: CreationOptional<number>
  /** How many. */
  declare quantity: number
  /** Price of one without surcharges, as entered. */
  declare unitPriceMinor: Minor
  /** Surcharges of the choices for one. */
  declare unitSurchargeMinor: CreationOptional<Minor>
  /** Deposit for one. */
  declare unitDepositMinor: Minor
  /** quantity × (price + surcharges), tax in. */
  declare totalMinor: Minor
  /** Class of goods. */
  declare taxClass: TaxClass
  /** Rate of tax when placed. */
  declare taxBasisPoints: number
  /** Tax in this line. */
  declare taxMinor: Minor
  /** Answers as given, or the defaults standing in. */
  declare choices: CreationOptional<ChosenAnswer[]>
  /** The promise: the day shown when it was placed. */
  declare postedByOn: Day
  /** The day of the last delay notice; null if none. */
  declare revisedPostedByOn: Day | null

  declare order?: NonAttribute<Order>
  declare runOffer?: NonAttribute<RunOffer>
  declare parcelLines?: NonAttribute<ParcelLine[]>
  declare units?: NonAttribute<Unit[]>

  facts(): PricedLine {
    return {
      quantity: this.quantity,
      priceMinor: this.unitPriceMinor,
      surchargeMinor: this.unitSurchargeMinor,
      depositMinor: this.unitDepositMinor,
      basisPoints: this.taxBasisPoints,
    }
  }
}

OrderLine.init(
  {
    id: key(),
    workshopId: ref(),
    orderId: ref(),
    runOfferId: ref(),
    offerKind: text(),
    position: preset(whole(), 0),
    quantity: whole(),
    unitPriceMinor: money(),
    unitSurchargeMinor: preset(money(), 0),
    unitDepositMinor: money(),
    totalMinor: money(),
    taxClass: text(),
    taxBasisPoints: whole(),
    taxMinor: money(),
    choices: preset(json(), []),
    postedByOn: day(),
    revisedPostedByOn: optional(day()),
  },
  table(sequelize, 'OrderLine', 'order_lines'),
)
