import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, preset, ref, table, text } from './columns'

/** A part that may stand in for another. */
export class PartAlternate extends Model<
  InferAttributes<PartAlternate>,
  InferCreationAttributes<PartAlternate>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The part. */
  declare partId: string
  /** What may stand in. */
  declare alternateId: string
  /** On what condition. */
  declare note: CreationOptional<string>
}

PartAlternate.init(
  {
    id: key(),
    workshopId: ref(),
    partId: ref(),
    alternateId: ref(),
    note: preset(text(), ''),
  },
  table(sequelize, 'PartAlternate', 'part_alternates'),
)
