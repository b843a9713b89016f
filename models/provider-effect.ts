import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, text } from './columns'

/** One change at the provider applied once, however many events told of it. */
export class ProviderEffect extends Model<
  InferAttributes<ProviderEffect>,
  InferCreationAttributes<ProviderEffect>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** Connected account. */
  declare account: string
  /** What changed. */
  declare objectId: string
  /** How it changed. */
  declare transition: string
  /** The event that brought it; null when a look-up did. */
  declare providerEventId: string | null
  /** When it was applied (business time). */
  declare at: Date
}

ProviderEffect.init(
  {
    id: key(),
    account: text(),
    objectId: text(),
    transition: text(),
    providerEventId: optional(ref()),
    at: moment(),
  },
  table(sequelize, 'ProviderEffect', 'provider_effects'),
)
