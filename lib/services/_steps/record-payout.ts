import 'server-only'
import { paidIn, paidOut } from '@/lib/core/ledger/entries'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { LedgerTransfer, Workshop } from '@/models'

export type PayoutNews = {
  payout: string
  state: 'pending' | 'paid' | 'failed'
  amount: number
  currency: string
}

/**
 * Books money that the provider sends to the workshop's bank when it leaves the balance, and back when it comes back.
 * Locks: nothing. Writes: one transfer. Repeat: safe; booked once each way.
 */
export async function recordPayout(account: string, news: PayoutNews, now: Date): Promise<string> {
  const workshop = await Workshop.findOne({ where: { providerAccountId: account }, attributes: ['id'] })
  if (!workshop) return 'not_ours'
  const { payout: sourceId, amount, currency, state } = news
  if (amount === 0) return state
  const source = { workshopId: workshop.id, source: 'payout', sourceId, orderId: null, runId: null, at: now }
  await inTransaction(async (tx) => {
    const where = { workshopId: workshop.id, source: 'payout', sourceId, kind: 'paid_out' }
    if (state !== 'failed')
      await postLedger(tx, { ...source, kind: 'paid_out', entries: paidOut({ amount, currency }) })
    else if ((await LedgerTransfer.count({ where, transaction: tx })) > 0)
      await postLedger(tx, { ...source, kind: 'paid_in', entries: paidIn({ amount, currency }) })
    return ok({})
  })
  return state
}
