import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, money, optional, preset, ref, table, text, whole } from './columns'
import type { Choice } from './choice'
import type { Destination } from './destination'
import type { Module } from './module'
import type { RunOffer } from './run-offer'
import type { SignUp } from './sign-up'
import type { OfferKind, TaxClass } from './words'

/** One form in which a module is sold; the template of what a run sells. */
export class Offer extends Model<InferAttributes<Offer>, InferCreationAttributes<Offer>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The module. */
  declare moduleId: string
  /** Which form. */
  declare kind: OfferKind
  /** Price of one, minor units of the workshop's currency, with tax when its prices include it; null while open. */
  declare priceMinor: Minor | null
  /** Part of the price paid as deposit; null while the price is open. */
  declare depositMinor: Minor | null
  /** Prices a sign-up may choose its highest from while the price is open, rising. */
  declare priceListMinor: CreationOptional<Minor[]>
  /** Class of goods for tax. */
  declare taxClass: CreationOptional<TaxClass>
  /** What the buyer gets, plain text. */
  declare contents: CreationOptional<string>
  /** Weight of the goods of one, grams, for customs; null until weighed. */
  declare netWeightG: number | null
  /** Weight of one packed for the post, grams; null until weighed. */
  declare packedWeightG: number | null
  /** Longest side of one packed, millimetres. */
  declare lengthMm: number | null
  /** Middle side of one packed, millimetres. */
  declare widthMm: number | null
  /** Shortest side of one packed, millimetres. */
  declare heightMm: number | null
  /** What customs reads; one that stands alone ("electronics") is refused at the label. */
  declare customsDescription: CreationOptional<string>
  /** Tariff code, digits only; empty until known. */
  declare customsCode: CreationOptional<string>
  /** Country of origin; null until known. */
  declare customsOrigin: string | null
  /** Where finished ones stand on the shelf, as pick lists name it; empty if nowhere. */
  declare storagePlace: CreationOptional<string>
  /** Cautions of this form (burns, lead, reversed power headers, no mains inside). */
  declare cautions: CreationOptional<string>
  /** Youngest age it is meant for, years. */
  declare ageFrom: CreationOptional<number>
  /** Order on the page, from 0. */
  declare position: CreationOptional<number>
  /** Since when it is not offered any more; null while it is. */
  declare withdrawnAt: Date | null

  declare module?: NonAttribute<Module>
  declare choices?: NonAttribute<Choice[]>
  declare destinations?: NonAttribute<Destination[]>
  declare runOffers?: NonAttribute<RunOffer[]>
  declare signups?: NonAttribute<SignUp[]>

  facts() {
    return {
      id: this.id,
      kind: this.kind,
      priceMinor: this.priceMinor,
      depositMinor: this.depositMinor,
      taxClass: this.taxClass,
      netWeightG: this.netWeightG,
      packedWeightG: this.packedWeightG,
      lengthMm: this.lengthMm,
      widthMm: this.widthMm,
      heightMm: this.heightMm,
      customsDescription: this.customsDescription,
      customsCode: this.customsCode,
      customsOrigin: this.customsOrigin,
      withdrawnAt: this.withdrawnAt,
    }
  }
}

Offer.init(
  {
    id: key(),
    workshopId: ref(),
    moduleId: ref(),
    kind: text(),
    priceMinor: optional(money()),
    depositMinor: optional(money()),
    priceListMinor: preset(json(), []),
    taxClass: preset(text(), 'standard'),
    contents: preset(text(), ''),
    netWeightG: optional(whole()),
    packedWeightG: optional(whole()),
    lengthMm: optional(whole()),
    widthMm: optional(whole()),
    heightMm: optional(whole()),
    customsDescription: preset(text(), ''),
    customsCode: preset(text(), ''),
    customsOrigin: optional(text()),
    storagePlace: preset(text(), ''),
    cautions: preset(text(), ''),
    ageFrom: preset(whole(), 14),
    position: preset(whole(), 0),
    withdrawnAt: optional(moment()),
  },
  table(sequelize, 'Offer', 'offers'),
)
