import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { Role } from '@/lib/core/policy/audience'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, text } from './columns'

/** A link mailed to someone asked to act for a workshop. */
export class StaffInvitation extends Model<
  InferAttributes<StaffInvitation>,
  InferCreationAttributes<StaffInvitation>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Address it was mailed to, normalised. */
  declare emailNormal: string
  /** Role they will have. */
  declare role: Role
  /** SHA-256 of the token in the link, hex. */
  declare tokenHash: string
  /** When it was sent (business time). */
  declare createdAt: Date
  /** Who asked them. */
  declare createdByPersonId: string
  /** When the link stops working. */
  declare expiresAt: Date
  /** When it was accepted; null while open. */
  declare acceptedAt: Date | null
  /** Who accepted; null while open. */
  declare acceptedByPersonId: string | null
  /** When it was withdrawn by the workshop; null while not. */
  declare withdrawnAt: Date | null
}

StaffInvitation.init(
  {
    id: key(),
    workshopId: ref(),
    emailNormal: text(),
    role: text(),
    tokenHash: text(),
    createdAt: moment(),
    createdByPersonId: ref(),
    expiresAt: moment(),
    acceptedAt: optional(moment()),
    acceptedByPersonId: optional(ref()),
    withdrawnAt: optional(moment()),
  },
  table(sequelize, 'StaffInvitation', 'staff_invitations'),
)
