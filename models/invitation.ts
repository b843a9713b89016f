import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { InvitationState } from '@/lib/core/states/invitation'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, ref, table, text } from './columns'
import type { Person } from './person'
import type { Run } from './run'
import type { SignUp } from './sign-up'

/** Tells one confirmed sign-up that a run takes deposits. */
export class Invitation extends Model<InferAttributes<Invitation>, InferCreationAttributes<Invitation>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run. */
  declare runId: string
  /** The sign-up. */
  declare signupId: string
  /** Who is invited. */
  declare personId: string
  /** Where it stands (states.md, invitation). */
  declare state: CreationOptional<InvitationState>
  /** When it was queued for sending (business time). */
  declare sentAt: Date
  /** When it ended in an order, a no or silence; null while open. */
  declare answeredAt: Date | null

  declare run?: NonAttribute<Run>
  declare signup?: NonAttribute<SignUp>
  declare person?: NonAttribute<Person>
}

Invitation.init(
  {
    id: key(),
    workshopId: ref(),
    runId: ref(),
    signupId: ref(),
    personId: ref(),
    state: preset(text(), 'sent'),
    sentAt: moment(),
    answeredAt: optional(moment()),
  },
  table(sequelize, 'Invitation', 'invitations'),
)
