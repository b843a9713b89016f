import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { bigWhole, moment, oneRow, optional, preset, table } from './columns'

/** How far business time runs ahead of real time: one row, forward only. */
export class ClockOffset extends Model<InferAttributes<ClockOffset>, InferCreationAttributes<ClockOffset>> {
  /** Always 1: there is one row. */
  declare id: CreationOptional<number>
  /** Milliseconds added to real time; never falls. */
  declare offsetMs: CreationOptional<number>
  /** When it was last moved (real time); null while never. */
  declare advancedAt: Date | null
}

ClockOffset.init(
  {
    id: oneRow(),
    offsetMs: preset(bigWhole(), 0),
    advancedAt: optional(moment()),
  },
  table(sequelize, 'ClockOffset', 'clock_offset'),
)
