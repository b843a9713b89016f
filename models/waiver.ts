import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, ref, table, text } from './columns'
import type { ReadinessKey } from './words'

/** A readiness line let pass for a run, with a reason. */
export class Waiver extends Model<InferAttributes<Waiver>, InferCreationAttributes<Waiver>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run. */
  declare runId: string
  /** Which line. */
  declare key: ReadinessKey
  /** Why. */
  declare reason: string
  /** Who let it pass. */
  declare byPersonId: string
  /** When (business time). */
  declare at: Date
}

Waiver.init(
  {
    id: key(),
    workshopId: ref(),
    runId: ref(),
    key: text(),
    reason: text(),
    byPersonId: ref(),
    at: moment(),
  },
  table(sequelize, 'Waiver', 'waivers'),
)
