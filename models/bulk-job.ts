import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, optional, preset, ref, table, text } from './columns'
import type { BulkItem } from './bulk-item'

/** A deed on many rows; n of m is counted from its items. */
export class BulkJob extends Model<InferAttributes<BulkJob>, InferCreationAttributes<BulkJob>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** What is done ('call_off_refunds', 'charge_balances', …). */
  declare kind: string
  /** The run; null if none. */
  declare runId: string | null
  /** What every item is done with. */
  declare params: CreationOptional<Record<string, unknown>>
  /** When it was ordered (business time). */
  declare createdAt: Date
  /** Who ordered it; null when the clock did. */
  declare byPersonId: string | null
  /** When no item was left waiting; null while running. */
  declare doneAt: Date | null

  declare items?: NonAttribute<BulkItem[]>
}

BulkJob.init(
  {
    id: key(),
    workshopId: ref(),
    kind: text(),
    runId: optional(ref()),
    params: preset(json(), {}),
    createdAt: moment(),
    byPersonId: optional(ref()),
    doneAt: optional(moment()),
  },
  table(sequelize, 'BulkJob', 'bulk_jobs'),
)
