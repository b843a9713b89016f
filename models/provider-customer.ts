import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, text } from './columns'

/** A person as the provider knows them on a workshop's account, with the saved card. */
export class ProviderCustomer extends Model<
  InferAttributes<ProviderCustomer>,
  InferCreationAttributes<ProviderCustomer>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Who. */
  declare personId: string
  /** The connected account. */
  declare providerAccountId: string
  /** The provider's id of the customer. */
  declare providerId: string
  /** The provider's id of the saved card; null while none is saved. */
  declare methodId: string | null
  /** Brand of that card as the provider names it. */
  declare methodBrand: string | null
  /** Its last four digits. */
  declare methodLast4: string | null
  /** When the agreement to charge it later was given. */
  declare methodSavedAt: Date | null
  /** When the customer was made (business time). */
  declare createdAt: Date
}

ProviderCustomer.init(
  {
    id: key(),
    workshopId: ref(),
    personId: ref(),
    providerAccountId: text(),
    providerId: text(),
    methodId: optional(text()),
    methodBrand: optional(text()),
    methodLast4: optional(text()),
    methodSavedAt: optional(moment()),
    createdAt: moment(),
  },
  table(sequelize, 'ProviderCustomer', 'provider_customers'),
)
