import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, ref, table, whole } from './columns'
import type { TestStep } from './json'

/** An ordered list of steps for a revision; a change is a new version. */
export class TestPlan extends Model<InferAttributes<TestPlan>, InferCreationAttributes<TestPlan>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The revision it tests. */
  declare revisionId: string
  /** Counts up from 1 within the revision. */
  declare version: number
  /** The steps in order: power first, then stage by stage. */
  declare steps: TestStep[]
  /** When this version was made (business time). */
  declare createdAt: Date
  /** Who made it. */
  declare createdByPersonId: string
}

TestPlan.init(
  {
    id: key(),
    workshopId: ref(),
    revisionId: ref(),
    version: whole(),
    steps: json(),
    createdAt: moment(),
    createdByPersonId: ref(),
  },
  table(sequelize, 'TestPlan', 'test_plans'),
)
