import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import type { SignupState } from '@/lib/core/states/signup'
import { sequelize } from '@/lib/db/sequelize'
import { flag, json, key, moment, money, optional, preset, ref, table, text, whole } from './columns'
import type { Invitation } from './invitation'
import type { Module } from './module'
import type { Offer } from './offer'
import type { Person } from './person'
import type { Certainty } from './words'

/** A statement of interest; counts once confirmed. */
export class SignUp extends Model<InferAttributes<SignUp>, InferCreationAttributes<SignUp>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The module. */
  declare moduleId: string
  /** The form wanted. */
  declare offerId: string
  /** Who. */
  declare personId: string
  /** How many, 1–10. */
  declare quantity: number
  /** Where to, ISO 3166-1 alpha-2. */
  declare country: string
  /** How sure they are. */
  declare certainty: Certainty
  /** Highest price at which they would still join, minor units; null if the price was fixed or it was left out. */
  declare topPriceMinor: Minor | null
  /** The price list as it was shown, rising; empty when the price was fixed. */
  declare askedPricesMinor: CreationOptional<Minor[]>
  /** The fixed price as it was shown; null while it was open. */
  declare shownPriceMinor: Minor | null
  /** Currency of these prices. */
  declare currency: string
  /** Whether they asked for news of the module. */
  declare wantsUpdates: CreationOptional<boolean>
  /** Where it stands (states.md, sign-up). */
  declare state: CreationOptional<SignupState>
  /** SHA-256 of the token in the confirming link, hex; null once the link was used up. */
  declare confirmTokenHash: string | null
  /** SHA-256 of the token in the link that changes or takes back, hex; null until confirmed. */
  declare takeBackTokenHash: string | null
  /** When the form was sent (business time). */
  declare submittedAt: Date
  /** When the confirming link stops working. */
  declare confirmExpiresAt: Date
  /** When it was confirmed; null while it was not. */
  declare confirmedAt: Date | null
  /** When it was taken back. */
  declare takenBackAt: Date | null
  /** When a later one of the same person replaced it. */
  declare supersededAt: Date | null

  declare module?: NonAttribute<Module>
  declare offer?: NonAttribute<Offer>
  declare person?: NonAttribute<Person>
  declare invitations?: NonAttribute<Invitation[]>

  facts() {
    return {
      id: this.id,
      moduleId: this.moduleId,
      offerId: this.offerId,
      personId: this.personId,
      quantity: this.quantity,
      country: this.country,
      certainty: this.certainty,
      topPriceMinor: this.topPriceMinor,
      state: this.state,
      submittedAt: this.submittedAt,
      confirmedAt: this.confirmedAt,
    }
  }
}

SignUp.init(
  {
    id: key(),
    workshopId: ref(),
    moduleId: ref(),
    offerId: ref(),
    personId: ref(),
    quantity: whole(),
    country: text(),
    certainty: text(),
    topPriceMinor: optional(money()),
    askedPricesMinor: preset(json(), []),
    shownPriceMinor: optional(money()),
    currency: text(),
    wantsUpdates: preset(flag(), false),
    state: preset(text(), 'unconfirmed'),
    confirmTokenHash: optional(text()),
    takeBackTokenHash: optional(text()),
    submittedAt: moment(),
    confirmExpiresAt: moment(),
    confirmedAt: optional(moment()),
    takenBackAt: optional(moment()),
    supersededAt: optional(moment()),
  },
  table(sequelize, 'SignUp', 'signups'),
)
