import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, money, ref, table, whole } from './columns'

/** What a run really cost and yielded, as its owner typed it. */
export class RunActuals extends Model<InferAttributes<RunActuals>, InferCreationAttributes<RunActuals>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run. */
  declare runId: string
  /** Everything it cost, in minor units of the run's currency. */
  declare costMinor: Minor
  /** Boards put into work. */
  declare started: number
  /** Boards that came out good. */
  declare good: number
  /** When it was typed (business time). */
  declare writtenAt: Date
  /** Who typed it. */
  declare byPersonId: string
}

RunActuals.init(
  {
    id: key(),
    workshopId: ref(),
    runId: ref(),
    costMinor: money(),
    started: whole(),
    good: whole(),
    writtenAt: moment(),
    byPersonId: ref(),
  },
  table(sequelize, 'RunActuals', 'run_actuals'),
)
