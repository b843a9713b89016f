import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, text } from './columns'

/** A one-time replacement for the second factor; only its hash is kept. */
export class RecoveryCode extends Model<
  InferAttributes<RecoveryCode>,
  InferCreationAttributes<RecoveryCode>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** Whose code it is. */
  declare userId: string
  /** SHA-256 of the code, hex. */
  declare codeHash: string
  /** When the set was made (business time). */
  declare createdAt: Date
  /** When it was spent; null while good. */
  declare usedAt: Date | null
}

RecoveryCode.init(
  {
    id: key(),
    userId: ref(),
    codeHash: text(),
    createdAt: moment(),
    usedAt: optional(moment()),
  },
  table(sequelize, 'RecoveryCode', 'recovery_codes'),
)
