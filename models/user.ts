import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { bigWhole, key, moment, optional, ref, table, text } from './columns'
import type { Person } from './person'
import type { RecoveryCode } from './recovery-code'
import type { Session } from './session'

/** A person who has signed in at least once, and the second factor. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The person behind the sign-in. */
  declare personId: string
  /** When the first sign-in was completed (business time). */
  declare createdAt: Date
  /** When a link sent to the address was last used; null before. */
  declare emailVerifiedAt: Date | null
  /** Second-factor secret, encrypted under the application's secret; null while none is set up. */
  declare totpSecretEncrypted: string | null
  /** When a first code proved that the secret had been copied; null while unproven. */
  declare totpConfirmedAt: Date | null
  /** Number of the last 30-second step whose code was accepted; no code of it or earlier is accepted again. */
  declare totpLastStep: number | null

  declare person?: NonAttribute<Person>
  declare sessions?: NonAttribute<Session[]>
  declare recoveryCodes?: NonAttribute<RecoveryCode[]>
}

User.init(
  {
    id: key(),
    personId: ref(),
    createdAt: moment(),
    emailVerifiedAt: optional(moment()),
    totpSecretEncrypted: optional(text()),
    totpConfirmedAt: optional(moment()),
    totpLastStep: optional(bigWhole()),
  },
  table(sequelize, 'User', 'users'),
)
