import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { day, key, moment, optional, ref, table, text, whole } from './columns'
import type { NoticeAnswer } from './notice-answer'
import type { Run } from './run'
import type { Changed, NoticeKind } from './words'

/** A message buyers must be able to act on. */
export class Notice extends Model<InferAttributes<Notice>, InferCreationAttributes<Notice>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run. */
  declare runId: string
  /** The offer it concerns; null for the whole run. */
  declare runOfferId: string | null
  /** A later date, a changed statement of the page, or a date that passed unannounced. */
  declare kind: NoticeKind
  /** What changed, for a change; null otherwise. */
  declare whatChanged: Changed | null
  /** 1, 2, … within run and offer: later ones have other rules. */
  declare number: number
  /** Why, in the maker's words. */
  declare reason: string
  /** The day given up; null for a change. */
  declare promisedByOn: Day | null
  /** The new day; null when there is none yet. */
  declare revisedByOn: Day | null
  /** When it was sent (business time). */
  declare sentAt: Date
  /** Who sent it; null when the clock did. */
  declare byPersonId: string | null

  declare run?: NonAttribute<Run>
  declare answers?: NonAttribute<NoticeAnswer[]>

  facts() {
    return {
      id: this.id,
      kind: this.kind,
      number: this.number,
      promisedByOn: this.promisedByOn,
      revisedByOn: this.revisedByOn,
      sentAt: this.sentAt,
    }
  }
}

Notice.init(
  {
    id: key(),
    workshopId: ref(),
    runId: ref(),
    runOfferId: optional(ref()),
    kind: text(),
    whatChanged: optional(text()),
    number: whole(),
    reason: text(),
    promisedByOn: optional(day()),
    revisedByOn: optional(day()),
    sentAt: moment(),
    byPersonId: optional(ref()),
  },
  table(sequelize, 'Notice', 'notices'),
)
