import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, text } from './columns'
import type { SuppressionCause, SuppressionScope } from './words'

/** An address that must not get certain mails; kept as a hash, also after erasure. */
export class Suppression extends Model<InferAttributes<Suppression>, InferCreationAttributes<Suppression>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** SHA-256 of the normalised address, hex. */
  declare emailHash: string
  /** Whose mails; null for everyone's. */
  declare workshopId: string | null
  /** Which mails: news, invitations, or all the contract does not need. */
  declare scope: SuppressionScope
  /** Why. */
  declare cause: SuppressionCause
  /** When (business time). */
  declare at: Date
}

Suppression.init(
  {
    id: key(),
    emailHash: text(),
    workshopId: optional(ref()),
    scope: text(),
    cause: text(),
    at: moment(),
  },
  table(sequelize, 'Suppression', 'suppressions'),
)
