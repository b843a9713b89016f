import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, optional, ref, table, text } from './columns'
import type { DecisionKind } from './words'

/** A decision with everything it was taken on. Never changed. */
export class Decision extends Model<InferAttributes<Decision>, InferCreationAttributes<Decision>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run. */
  declare runId: string
  /** What was decided. */
  declare kind: DecisionKind
  /** Reason given; null where none was needed. */
  declare reason: string | null
  /** What the figures were computed from. */
  declare inputs: Record<string, unknown>
  /** The figures as they stood. */
  declare figures: Record<string, unknown>
  /** Version of the calculations that made them. */
  declare coreVersion: string
  /** Who decided; null when the clock did. */
  declare byPersonId: string | null
  /** When (business time). */
  declare at: Date
}

Decision.init(
  {
    id: key(),
    workshopId: ref(),
    runId: ref(),
    kind: text(),
    reason: optional(text()),
    inputs: json(),
    figures: json(),
    coreVersion: text(),
    byPersonId: optional(ref()),
    at: moment(),
  },
  table(sequelize, 'Decision', 'decisions'),
)
