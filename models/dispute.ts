import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, money, optional, preset, ref, table, text } from './columns'
import type { Order } from './order'
import type { DisputeState } from './words'

/** A payment the buyer's bank took back or questions. */
export class Dispute extends Model<InferAttributes<Dispute>, InferCreationAttributes<Dispute>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The order. */
  declare orderId: string
  /** The payment. */
  declare attemptId: string
  /** The provider's id. */
  declare providerId: string
  /** Sum in dispute. */
  declare amountMinor: Minor
  /** Its currency. */
  declare currency: string
  /** The provider's code for the reason. */
  declare reason: string
  /** How it stands. */
  declare state: CreationOptional<DisputeState>
  /** When evidence must be in; null if none is asked. */
  declare evidenceDueAt: Date | null
  /** When it was opened. */
  declare openedAt: Date
  /** When it was decided; null while open. */
  declare closedAt: Date | null

  declare order?: NonAttribute<Order>
}

Dispute.init(
  {
    id: key(),
    workshopId: ref(),
    orderId: ref(),
    attemptId: ref(),
    providerId: text(),
    amountMinor: money(),
    currency: text(),
    reason: text(),
    state: preset(text(), 'open'),
    evidenceDueAt: optional(moment()),
    openedAt: moment(),
    closedAt: optional(moment()),
  },
  table(sequelize, 'Dispute', 'disputes'),
)
