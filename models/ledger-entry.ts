import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import type { Account } from '@/lib/core/ledger/accounts'
import type { Entry } from '@/lib/core/ledger/balance'
import { sequelize } from '@/lib/db/sequelize'
import { key, money, ref, table, text, whole } from './columns'
import type { LedgerTransfer } from './ledger-transfer'

/** One side of a transfer. Never changed. */
export class LedgerEntry extends Model<InferAttributes<LedgerEntry>, InferCreationAttributes<LedgerEntry>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The transfer. */
  declare transferId: string
  /** Account of the books (lib/core/ledger/accounts). */
  declare account: Account
  /** Currency of the amount. */
  declare currency: string
  /** Debit positive, credit negative, minor units; never 0. */
  declare amountMinor: Minor
  /** Order within the transfer, from 0. */
  declare position: number

  declare transfer?: NonAttribute<LedgerTransfer>

  facts(): Entry {
    return { account: this.account, currency: this.currency, amount: this.amountMinor }
  }
}

LedgerEntry.init(
  {
    id: key(),
    workshopId: ref(),
    transferId: ref(),
    account: text(),
    currency: text(),
    amountMinor: money(),
    position: whole(),
  },
  table(sequelize, 'LedgerEntry', 'ledger_entries'),
)
