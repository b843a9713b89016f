import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, ref, table, text, whole } from './columns'

/** What was forecast of a run at a quarter of its window, kept to be held against what came. */
export class Forecast extends Model<InferAttributes<Forecast>, InferCreationAttributes<Forecast>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run. */
  declare runId: string
  /** How many quarters of the window were gone: 1, 2 or 3. */
  declare quarter: number
  /** When (business time). */
  declare at: Date
  /** Units under deposit then. */
  declare deposited: number
  /** The minimum then. */
  declare minimum: number
  /** Mean, low, high of the 80 % range, and the chance to reach the minimum. */
  declare figures: { mean: number; low: number; high: number; chance: number }
  /** Version of the calculations. */
  declare coreVersion: string
}

Forecast.init(
  {
    id: key(),
    workshopId: ref(),
    runId: ref(),
    quarter: whole(),
    at: moment(),
    deposited: whole(),
    minimum: whole(),
    figures: json(),
    coreVersion: text(),
  },
  table(sequelize, 'Forecast', 'forecasts'),
)
