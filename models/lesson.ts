import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, ref, table, text } from './columns'

/** A fault or improvement learned on a revision. */
export class Lesson extends Model<InferAttributes<Lesson>, InferCreationAttributes<Lesson>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The module. */
  declare moduleId: string
  /** The revision it was found on. */
  declare foundOnRevisionId: string
  /** What was seen. */
  declare symptom: string
  /** How it was found. */
  declare howFound: CreationOptional<string>
  /** Why it happens; empty while unknown. */
  declare cause: CreationOptional<string>
  /** What mends it; empty while unknown. */
  declare remedy: CreationOptional<string>
  /** When it was written down (business time). */
  declare createdAt: Date
  /** Who wrote it down. */
  declare createdByPersonId: string
  /** The revision that mends it; null while none does. */
  declare mendedInRevisionId: string | null
  /** When it was decided to live with it; null while not. */
  declare waivedAt: Date | null
  /** Who decided so. */
  declare waivedByPersonId: string | null
  /** Why. */
  declare waivedReason: string | null

  facts() {
    return {
      id: this.id,
      foundOnRevisionId: this.foundOnRevisionId,
      mendedInRevisionId: this.mendedInRevisionId,
      waivedAt: this.waivedAt,
    }
  }
}

Lesson.init(
  {
    id: key(),
    workshopId: ref(),
    moduleId: ref(),
    foundOnRevisionId: ref(),
    symptom: text(),
    howFound: preset(text(), ''),
    cause: preset(text(), ''),
    remedy: preset(text(), ''),
    createdAt: moment(),
    createdByPersonId: ref(),
    mendedInRevisionId: optional(ref()),
    waivedAt: optional(moment()),
    waivedByPersonId: optional(ref()),
    waivedReason: optional(text()),
  },
  table(sequelize, 'Lesson', 'lessons'),
)
