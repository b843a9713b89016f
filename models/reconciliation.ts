import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { Day } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { day, json, key, moment, preset, ref, table, whole } from './columns'
import type { ReconciliationDifference } from './json'

/** A day's comparison of the ledger with the provider's own list. */
export class Reconciliation extends Model<
  InferAttributes<Reconciliation>,
  InferCreationAttributes<Reconciliation>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The day compared, in the workshop's zone. */
  declare day: Day
  /** When (business time). */
  declare comparedAt: Date
  /** Movements compared. */
  declare itemCount: number
  /** Every difference; empty when the books agree. */
  declare differences: CreationOptional<ReconciliationDifference[]>
}

Reconciliation.init(
  {
    id: key(),
    workshopId: ref(),
    day: day(),
    comparedAt: moment(),
    itemCount: whole(),
    differences: preset(json(), []),
  },
  table(sequelize, 'Reconciliation', 'reconciliations'),
)
