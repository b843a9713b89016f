import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { flag, json, key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { PlanStep } from './json'

/** A cost plan with its schedule: the base of a module or run, or a named what-if. */
export class Plan extends Model<InferAttributes<Plan>, InferCreationAttributes<Plan>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The module. */
  declare moduleId: string
  /** The run it plans; null while it is the module's own. */
  declare runId: string | null
  /** Name of the plan or what-if. */
  declare name: CreationOptional<string>
  /** True: the one decisions are computed from. */
  declare isBase: CreationOptional<boolean>
  /** The cost plan (lib/core/costs/plan), checked when written. */
  declare plan: Record<string, unknown>
  /** Steps of the schedule with three-point estimates, days. */
  declare steps: CreationOptional<PlanStep[]>
  /** The quantity a what-if is about; null: the run's own. */
  declare units: CreationOptional<number | null>
  /** When it was made (business time). */
  declare createdAt: Date
  /** When it was last changed (business time). */
  declare changedAt: Date
  /** Who changed it last. */
  declare changedByPersonId: string
}

Plan.init(
  {
    id: key(),
    workshopId: ref(),
    moduleId: ref(),
    runId: optional(ref()),
    name: preset(text(), 'Base'),
    isBase: preset(flag(), true),
    plan: json(),
    steps: preset(json(), []),
    units: optional(whole()),
    createdAt: moment(),
    changedAt: moment(),
    changedByPersonId: ref(),
  },
  table(sequelize, 'Plan', 'plans'),
)
