import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, money, optional, ref, table, whole } from './columns'
import type { OrderTerms } from './json'
import type { Order } from './order'

/** A change of an order before the lock; its difference is paid back or is a payment of its own. */
export class OrderChange extends Model<InferAttributes<OrderChange>, InferCreationAttributes<OrderChange>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The order. */
  declare orderId: string
  /** 1, 2, …: the purpose of its payment is change-1, change-2, …. */
  declare number: number
  /** Lines and sums before. */
  declare before: OrderTerms
  /** Lines and sums after. */
  declare after: OrderTerms
  /** What the deposit rises (or, negative, falls) by. */
  declare differenceMinor: Minor
  /** When it was asked for (business time). */
  declare at: Date
  /** Who asked. */
  declare byPersonId: string
  /** When it took effect; null while its payment is open. */
  declare appliedAt: Date | null
  /** When it was dropped unpaid; null otherwise. */
  declare droppedAt: Date | null

  declare order?: NonAttribute<Order>
}

OrderChange.init(
  {
    id: key(),
    workshopId: ref(),
    orderId: ref(),
    number: whole(),
    before: json(),
    after: json(),
    differenceMinor: money(),
    at: moment(),
    byPersonId: ref(),
    appliedAt: optional(moment()),
    droppedAt: optional(moment()),
  },
  table(sequelize, 'OrderChange', 'order_changes'),
)
