import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { Part } from './part'
import type { StockCause } from './words'

/** Pieces going in or out of stock. Never changed; on hand is the sum. */
export class StockMove extends Model<InferAttributes<StockMove>, InferCreationAttributes<StockMove>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The part. */
  declare partId: string
  /** The lot they came with; null if none. */
  declare lotId: string | null
  /** The run they went into; null if none. */
  declare runId: string | null
  /** Pieces, in positive, out negative; never 0. */
  declare change: number
  /** Why. */
  declare cause: StockCause
  /** Remark. */
  declare note: CreationOptional<string>
  /** Who. */
  declare byPersonId: string
  /** When (business time). */
  declare at: Date

  declare part?: NonAttribute<Part>
}

StockMove.init(
  {
    id: key(),
    workshopId: ref(),
    partId: ref(),
    lotId: optional(ref()),
    runId: optional(ref()),
    change: whole(),
    cause: text(),
    note: preset(text(), ''),
    byPersonId: ref(),
    at: moment(),
  },
  table(sequelize, 'StockMove', 'stock_moves'),
)
