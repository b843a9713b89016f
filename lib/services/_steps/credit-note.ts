import 'server-only'
import type { Transaction } from 'sequelize'
import { grossOf, partsOfPayment } from '@/lib/core/orders/tax-parts'
import { invoiceText } from '@/lib/messages/invoices'
import { issueInvoice } from '@/lib/services/_steps/issue-invoice'
import { lineOf, standingInvoices, type StandingInvoice } from '@/lib/services/_steps/invoice-parts'
import { bookTax } from '@/lib/services/_steps/prepayment-invoice'
import { Invoice, type Order, Refund } from '@/models'

/**
 * The credit note of money that goes back: of the order's final invoice once it is posted, before that of the paper of the
 * payment it goes back on. A refund that repeats a failed one needs none of its own; a payment that never counted had no
 * paper. With it the tax in the sum is no longer owed.
 * The caller has locked the order. Writes: one invoice, one transfer where tax moves. Repeat: safe.
 */
export async function creditRefund(
  tx: Transaction,
  { order, refund, now }: { order: Order; refund: Refund; now: Date },
): Promise<void> {
  if (await isCredited(tx, refund)) return
  const standing = await standingInvoices(tx, order.id)
  const final = standing.find(({ invoice }) => invoice.kind === 'final')
  const owns = standing.filter(({ invoice }) => invoice.attemptId === refund.attemptId)
  const corrected = final ?? owns.find(({ left }) => grossOf(left) >= refund.amountMinor) ?? owns.at(-1)
  if (!corrected) return
  await credit(tx, { order, corrected, amount: refund.amountMinor, refundId: refund.id, now })
}

/**
 * Takes back whatever papers of an order still stand before its posting, without money going back: a kept deposit is no
 * payment for goods. Its tax is booked by the caller.
 * The caller has locked the order. Writes: invoices. Repeat: safe.
 */
export async function creditStanding(tx: Transaction, order: Order, now: Date): Promise<void> {
  for (const { invoice, left, isTaxedLater } of await standingInvoices(tx, order.id)) {
    if (grossOf(left) <= 0) continue
    const lines = left.map((part) => lineOf(invoiceText.kept, part, isTaxedLater ? { isTaxedLater } : {}))
    await issueInvoice(tx, { kind: 'credit_note', order, corrects: invoice, lines, now })
  }
}

async function credit(
  tx: Transaction,
  given: { order: Order; corrected: StandingInvoice; amount: number; refundId: string; now: Date },
): Promise<void> {
  const { order, corrected, amount, refundId, now } = given
  const { invoice, left, isTaxedLater } = corrected
  const parts = partsOfPayment({
    whole: left,
    before: [],
    amount: Math.min(amount, Math.max(0, grossOf(left))),
  })
  if (parts.length === 0) return
  const text = invoiceText.credit(invoice.number)
  const lines = parts.map((part) => lineOf(text, part, isTaxedLater ? { isTaxedLater } : {}))
  const note = await issueInvoice(tx, { kind: 'credit_note', order, corrects: invoice, refundId, lines, now })
  await bookTax(tx, { order, invoice: note, sign: -1, now })
}

/** Whether this refund, or one it repeats, has its credit note. */
async function isCredited(tx: Transaction, refund: Refund): Promise<boolean> {
  const ids = [refund.id]
  for (let before = refund.retryOfId; before !== null;) {
    ids.push(before)
    const row: Refund | null = await Refund.findByPk(before, { attributes: ['retryOfId'], transaction: tx })
    before = row?.retryOfId ?? null
  }
  return (await Invoice.count({ where: { refundId: ids }, transaction: tx })) > 0
}
