import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { flag, key, moment, optional, preset, ref, table, text } from './columns'
import type { Run } from './run'
import type { UpdateAudience } from './words'

/** News of a run to its buyers. */
export class RunUpdate extends Model<InferAttributes<RunUpdate>, InferCreationAttributes<RunUpdate>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run. */
  declare runId: string
  /** Title. */
  declare title: string
  /** Text, plain. */
  declare body: string
  /** Who gets it. */
  declare audience: CreationOptional<UpdateAudience>
  /** Whether the public page shows it. */
  declare isPublic: CreationOptional<boolean>
  /** When it was written (business time). */
  declare createdAt: Date
  /** Who wrote it. */
  declare byPersonId: string
  /** When sending began; null for a draft. */
  declare sentAt: Date | null

  declare run?: NonAttribute<Run>
}

RunUpdate.init(
  {
    id: key(),
    workshopId: ref(),
    runId: ref(),
    title: text(),
    body: text(),
    audience: preset(text(), 'orders'),
    isPublic: preset(flag(), true),
    createdAt: moment(),
    byPersonId: ref(),
    sentAt: optional(moment()),
  },
  table(sequelize, 'RunUpdate', 'updates'),
)
