import 'server-only'
import type { Transaction } from 'sequelize'
import { QueryTypes } from 'sequelize'
import { isBalanced, type Entry } from '@/lib/core/ledger/entries'
import { sequelize } from '@/lib/db/sequelize'
import { LedgerEntry } from '@/models'

type Posting = {
  workshopId: string
  /** Kind of row that caused it: 'payment_attempt', 'refund', 'order', 'dispute'. */
  source: string
  sourceId: string
  /** What the movement is: 'deposit_paid', 'refunded', 'order_posted', … */
  kind: string
  orderId: string | null
  runId: string | null
  at: Date
  entries: readonly Entry[]
}

/**
 * Books one movement, once: the same source, id and kind a second time books nothing and answers false.
 * Throws for entries that do not balance. No entries (a free order) book nothing.
 * Locks: nothing. Writes: one transfer and its entries, never changed afterwards. Repeat: safe.
 */
export async function postLedger(tx: Transaction, posting: Posting): Promise<boolean> {
  const { entries, at, ...rest } = posting
  if (!isBalanced(entries)) throw new RangeError(`postLedger: ${rest.kind} does not balance`)
  if (entries.length === 0) return false
  const [transfer] = await sequelize.query<{ id: string }>(
    `insert into ledger_transfers (workshop_id, source, source_id, kind, order_id, run_id, at)
     values ($workshopId, $source, $sourceId, $kind, $orderId, $runId, $at)
     on conflict (workshop_id, source, source_id, kind) do nothing returning id`,
    { bind: { ...rest, at: at.toISOString() }, type: QueryTypes.SELECT, transaction: tx },
  )
  if (!transfer) return false
  await LedgerEntry.bulkCreate(
    entries.map(({ account, currency, amount }, position) => ({
      workshopId: rest.workshopId,
      transferId: transfer.id,
      account,
      currency,
      amountMinor: amount,
      position,
    })),
    { transaction: tx },
  )
  return true
}
