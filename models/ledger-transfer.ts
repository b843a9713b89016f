import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, text } from './columns'
import type { LedgerEntry } from './ledger-entry'

/** One movement of money; its entries sum to zero in each currency. Never changed. */
export class LedgerTransfer extends Model<
  InferAttributes<LedgerTransfer>,
  InferCreationAttributes<LedgerTransfer>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Kind of thing that caused it ('payment_attempt', 'refund', …). */
  declare source: string
  /** Its id. */
  declare sourceId: string
  /** What the movement is ('deposit_paid', 'refunded', …). */
  declare kind: string
  /** The order it belongs to; null if none. */
  declare orderId: string | null
  /** The run it belongs to; null if none. */
  declare runId: string | null
  /** When it happened (business time). */
  declare at: Date

  declare entries?: NonAttribute<LedgerEntry[]>
}

LedgerTransfer.init(
  {
    id: key(),
    workshopId: ref(),
    source: text(),
    sourceId: text(),
    kind: text(),
    orderId: optional(ref()),
    runId: optional(ref()),
    at: moment(),
  },
  table(sequelize, 'LedgerTransfer', 'ledger_transfers'),
)
