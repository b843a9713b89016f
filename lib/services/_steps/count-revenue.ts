import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { orderPosted } from '@/lib/core/ledger/entries'
import { sequelize } from '@/lib/db/sequelize'
import { issueFinal } from '@/lib/services/_steps/final-invoice'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import type { Order } from '@/models'

/**
 * Books a posted order: what the ledger still holds of the buyer's money for it becomes sales and tax. An order nobody
 * paid for books nothing. Tax is that of its final invoice.
 * The caller has locked the order. Writes: one invoice, one transfer. Repeat: safe, booked once.
 */
export async function countRevenue(tx: Transaction, order: Order, now: Date): Promise<void> {
  const { gross, taxBooked } = await heldFor(tx, order)
  if (gross <= 0) return
  const { taxMinor: tax } = await issueFinal(tx, { order, heldMinor: gross, now })
  await postLedger(tx, {
    workshopId: order.workshopId,
    source: 'order',
    sourceId: order.id,
    kind: 'order_posted',
    orderId: order.id,
    runId: order.runId,
    at: now,
    entries: orderPosted({ gross, tax, taxBooked, currency: order.currency }),
  })
}

async function heldFor(tx: Transaction, order: Order): Promise<{ gross: number; taxBooked: number }> {
  const [sums] = await sequelize.query<{ gross: number; taxBooked: number }>(
    `select coalesce(-sum(e.amount_minor) filter (where e.account = 'customer_deposits'), 0)::bigint as gross,
            coalesce(sum(e.amount_minor) filter (where e.account = 'tax_on_deposits'), 0)::bigint as "taxBooked"
     from ledger_entries e join ledger_transfers t on t.id = e.transfer_id
     where t.workshop_id = $workshopId and t.order_id = $orderId and e.currency = $currency`,
    {
      bind: { workshopId: order.workshopId, orderId: order.id, currency: order.currency },
      type: QueryTypes.SELECT,
      transaction: tx,
    },
  )
  if (!sums) throw new Error('countRevenue: no sums')
  return sums
}
