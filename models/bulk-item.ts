import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { BulkJob } from './bulk-job'
import type { BulkItemState } from './words'

/** One row a bulk job acts on. */
export class BulkItem extends Model<InferAttributes<BulkItem>, InferCreationAttributes<BulkItem>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The job. */
  declare bulkJobId: string
  /** The row acted on. */
  declare subjectId: string
  /** Order of working, from 0. */
  declare position: number
  /** How it stands. */
  declare state: CreationOptional<BulkItemState>
  /** Why it failed; null otherwise. */
  declare reason: string | null
  /** When it was done or failed. */
  declare doneAt: Date | null

  declare job?: NonAttribute<BulkJob>
}

BulkItem.init(
  {
    id: key(),
    workshopId: ref(),
    bulkJobId: ref(),
    subjectId: ref(),
    position: whole(),
    state: preset(text(), 'waiting'),
    reason: optional(text()),
    doneAt: optional(moment()),
  },
  table(sequelize, 'BulkItem', 'bulk_items'),
)
