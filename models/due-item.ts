import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, ref, table, text, whole } from './columns'

/** Something that falls due at an instant, found by the due task. */
export class DueItem extends Model<InferAttributes<DueItem>, InferCreationAttributes<DueItem>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** What falls due. */
  declare kind: string
  /** The row it concerns. */
  declare subjectId: string
  /** Its workshop; null if none. */
  declare workshopId: string | null
  /** When (business time). */
  declare dueAt: Date
  /** When it had been dealt with; null while it has not. */
  declare doneAt: Date | null
  /** Tries that failed so far. */
  declare attempts: CreationOptional<number>
  /** What went wrong last; null if nothing did. */
  declare lastError: string | null
}

DueItem.init(
  {
    id: key(),
    kind: text(),
    subjectId: ref(),
    workshopId: optional(ref()),
    dueAt: moment(),
    doneAt: optional(moment()),
    attempts: preset(whole(), 0),
    lastError: optional(text()),
  },
  table(sequelize, 'DueItem', 'due_items'),
)
