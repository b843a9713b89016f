import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, text } from './columns'
import type { Parcel } from './parcel'
import type { Person } from './person'

/** Parcels one packer works through, so that two packers never pack the same order. */
export class PackBatch extends Model<InferAttributes<PackBatch>, InferCreationAttributes<PackBatch>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run; null where it goes across runs. */
  declare runId: string | null
  /** Name on its papers. */
  declare name: string
  /** Who packs it. */
  declare packerPersonId: string
  /** When it was made up (business time). */
  declare createdAt: Date
  /** When everything in it was handed over; null while open. */
  declare closedAt: Date | null

  declare parcels?: NonAttribute<Parcel[]>
  declare packer?: NonAttribute<Person>
}

PackBatch.init(
  {
    id: key(),
    workshopId: ref(),
    runId: optional(ref()),
    name: text(),
    packerPersonId: ref(),
    createdAt: moment(),
    closedAt: optional(moment()),
  },
  table(sequelize, 'PackBatch', 'pack_batches'),
)
