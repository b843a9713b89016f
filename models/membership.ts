import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Role } from '@/lib/core/policy/audience'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, text } from './columns'
import type { Person } from './person'
import type { Workshop } from './workshop'

/** Says that a person acts for a workshop, in one role. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Who. */
  declare personId: string
  /** What they may do (lib/core/policy). */
  declare role: Role
  /** Since when (business time). */
  declare createdAt: Date
  /** Who let them in; null for the founder. */
  declare createdByPersonId: string | null
  /** When they stopped acting for it; null while they do. */
  declare endedAt: Date | null

  declare workshop?: NonAttribute<Workshop>
  declare person?: NonAttribute<Person>

  facts() {
    return { workshopId: this.workshopId, personId: this.personId, role: this.role, endedAt: this.endedAt }
  }
}

Membership.init(
  {
    id: key(),
    workshopId: ref(),
    personId: ref(),
    role: text(),
    createdAt: moment(),
    createdByPersonId: optional(ref()),
    endedAt: optional(moment()),
  },
  table(sequelize, 'Membership', 'memberships'),
)
