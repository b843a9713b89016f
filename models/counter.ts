import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, preset, ref, table, text, whole } from './columns'
import type { CounterSeries } from './words'

/** Last number given out per series; taken under its row lock, so that invoices have no gaps. */
export class Counter extends Model<InferAttributes<Counter>, InferCreationAttributes<Counter>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Which numbers are counted. */
  declare series: CounterSeries
  /** The number given out last; 0 before the first. */
  declare last: CreationOptional<number>
}

Counter.init(
  {
    id: key(),
    workshopId: ref(),
    series: text(),
    last: preset(whole(), 0),
  },
  table(sequelize, 'Counter', 'counters'),
)
