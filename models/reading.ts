import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { decimal, flag, key, moment, optional, preset, ref, table, text } from './columns'
import type { Verdict } from './words'

/** One result of one step on one unit. Never changed; measured again is a new row. */
export class Reading extends Model<InferAttributes<Reading>, InferCreationAttributes<Reading>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Id made at the bench, so that a reading sent twice is stored once. */
  declare clientId: string
  /** The unit. */
  declare unitId: string
  /** The plan, and with it the version. */
  declare testPlanId: string
  /** Key of the step within the plan. */
  declare stepKey: string
  /** Measured value in the step's unit; null for yes/no, text and over range. */
  declare value: string | null
  /** True: the instrument showed over range. */
  declare overRange: CreationOptional<boolean>
  /** Answer of a yes/no or text step; null otherwise. */
  declare word: string | null
  /** How it was judged when taken. */
  declare verdict: Verdict
  /** When it was taken at the bench. */
  declare takenAt: Date
  /** Who took it. */
  declare takenByPersonId: string
  /** When it reached the server (business time). */
  declare receivedAt: Date
}

Reading.init(
  {
    id: key(),
    workshopId: ref(),
    clientId: ref(),
    unitId: ref(),
    testPlanId: ref(),
    stepKey: text(),
    value: optional(decimal(18, 6)),
    overRange: preset(flag(), false),
    word: optional(text()),
    verdict: text(),
    takenAt: moment(),
    takenByPersonId: ref(),
    receivedAt: moment(),
  },
  table(sequelize, 'Reading', 'readings'),
)
