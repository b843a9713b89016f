import 'server-only'
import type { Transaction } from 'sequelize'
import { taxDue, taxDueBack } from '@/lib/core/ledger/entries'
import { minor } from '@/lib/core/brand'
import { grossOf, partsOfPayment, type TaxPart, taxParts } from '@/lib/core/orders/tax-parts'
import { taxCountryOf } from '@/lib/core/orders/tax-rate'
import { invoiceText } from '@/lib/messages/invoices'
import { issueInvoice } from '@/lib/services/_steps/issue-invoice'
import { lineOf, partsOfInvoice, partsOfOrder, standingInvoices } from '@/lib/services/_steps/invoice-parts'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { type Invoice, type Order, type PaymentAttempt, Workshop } from '@/models'

/**
 * The paper of a payment that counts for an order before it is posted. Where the workshop's tax falls due on arrival, the
 * tax in it is owed from now on and waits on `tax_on_deposits` for the posting.
 * The caller has locked the order. Writes: one invoice, one transfer where tax is due. Repeat: issues another.
 */
export async function issuePrepayment(
  tx: Transaction,
  { order, attempt, now }: { order: Order; attempt: PaymentAttempt; now: Date },
): Promise<Invoice> {
  const standing = await standingInvoices(tx, order.id)
  const before = taxParts(standing.flatMap(({ left }) => left))
  const parts = partsOfPayment({ whole: await partsOfOrder(tx, order), before, amount: attempt.amountMinor })
  return writePrepayment(tx, { order, attemptId: attempt.id, purpose: attempt.purpose, parts, now })
}

/** The same for an order that was paid outside the provider. Writes: one invoice, one transfer. Repeat: issues another. */
export async function issueOutsidePrepayment(tx: Transaction, order: Order, now: Date): Promise<Invoice> {
  const parts = await partsOfOrder(tx, order)
  return writePrepayment(tx, { order, attemptId: null, purpose: 'outside', parts, now })
}

async function writePrepayment(
  tx: Transaction,
  given: { order: Order; attemptId: string | null; purpose: string; parts: TaxPart[]; now: Date },
): Promise<Invoice> {
  const { order, parts, now } = given
  const workshop = await Workshop.findByPk(order.workshopId, { transaction: tx, rejectOnEmpty: true })
  const isTaxedLater = !workshop.depositsTaxed
  const text = invoiceText.prepayment(given.purpose, order.number)
  const lines = parts.map((part) =>
    isTaxedLater ? lineOf(text, { ...part, taxMinor: minor(0) }, { isTaxedLater }) : lineOf(text, part),
  )
  const { attemptId } = given
  const invoice = await issueInvoice(tx, { kind: 'prepayment', order, attemptId, lines, now })
  await bookTax(tx, { order, invoice, sign: 1, now })
  return invoice
}

/**
 * Sets the papers of an order right whose country or rates are other ones now: what was charged is taken back and charged
 * anew. Nothing where they stay.
 * The caller has locked the order and written its new sums. Writes: credit notes, invoices, transfers. Repeat: safe.
 */
export async function reissuePrepayments(tx: Transaction, order: Order, now: Date): Promise<void> {
  const workshop = await Workshop.findByPk(order.workshopId, { transaction: tx, rejectOnEmpty: true })
  const { taxMode: mode, country: destination } = order
  const taxCountry = taxCountryOf({ mode, home: workshop.country, destination })
  const whole = await partsOfOrder(tx, order)
  const rates = whole.map(({ basisPoints }) => basisPoints)
  const standing = (await standingInvoices(tx, order.id)).filter(({ left }) => grossOf(left) > 0)
  const isAsBefore = standing.every(
    ({ invoice, left }) =>
      invoice.taxCountry === taxCountry && left.every(({ basisPoints }) => rates.includes(basisPoints)),
  )
  if (isAsBefore) return
  let before: TaxPart[] = []
  for (const { invoice, left, isTaxedLater } of standing) {
    const lines = left.map((part) => lineOf(invoiceText.reissued, part, isTaxedLater ? { isTaxedLater } : {}))
    const note = await issueInvoice(tx, { kind: 'credit_note', order, corrects: invoice, lines, now })
    await bookTax(tx, { order, invoice: note, sign: -1, now })
    const parts = partsOfPayment({ whole, before, amount: grossOf(left) })
    const { attemptId } = invoice
    const again = await writePrepayment(tx, { order, attemptId, purpose: 'again', parts, now })
    before = taxParts([...before, ...partsOfInvoice(again)])
  }
}

/** Books the tax of a paper that moves it before the posting, once per paper. */
export async function bookTax(
  tx: Transaction,
  given: { order: Order; invoice: Invoice; sign: 1 | -1; now: Date },
): Promise<void> {
  const { order, invoice, sign, now } = given
  const { taxMinor: amount, currency } = invoice
  if (amount === 0) return
  const isPosted = order.postedAt !== null
  await postLedger(tx, {
    workshopId: order.workshopId,
    source: 'invoice',
    sourceId: invoice.id,
    kind: sign === 1 ? 'tax_due' : 'tax_due_back',
    orderId: order.id,
    runId: order.runId,
    at: now,
    entries: sign === 1 ? taxDue({ amount, currency }) : taxDueBack({ amount, currency, posted: isPosted }),
  })
}
