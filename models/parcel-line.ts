import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, whole } from './columns'
import type { OrderLine } from './order-line'
import type { Parcel } from './parcel'
import type { Unit } from './unit'

/** So many of an order's line in a parcel. */
export class ParcelLine extends Model<InferAttributes<ParcelLine>, InferCreationAttributes<ParcelLine>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The parcel. */
  declare parcelId: string
  /** The line of an order. */
  declare orderLineId: string
  /** How many of it. */
  declare quantity: number
  /** The very piece, where serial numbers are recorded (quantity 1); null otherwise. */
  declare unitId: string | null
  /** When the packer last ticked or scanned it; null while not. */
  declare tickedAt: Date | null

  declare orderLine?: NonAttribute<OrderLine>
  declare parcel?: NonAttribute<Parcel>
  declare unit?: NonAttribute<Unit>
}

ParcelLine.init(
  {
    id: key(),
    workshopId: ref(),
    parcelId: ref(),
    orderLineId: ref(),
    quantity: whole(),
    unitId: optional(ref()),
    tickedAt: optional(moment()),
  },
  table(sequelize, 'ParcelLine', 'parcel_lines'),
)
