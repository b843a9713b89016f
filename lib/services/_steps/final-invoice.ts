import 'server-only'
import type { Transaction } from 'sequelize'
import { minor } from '@/lib/core/brand'
import { lessParts, partsOfPayment, taxOf, taxParts } from '@/lib/core/orders/tax-parts'
import { invoiceText } from '@/lib/messages/invoices'
import { writtenDay } from '@/lib/messages/written'
import { issueInvoice } from '@/lib/services/_steps/issue-invoice'
import {
  lineOf,
  partsOfOrder,
  standingInvoices,
  type StandingInvoice,
} from '@/lib/services/_steps/invoice-parts'
import { Module, type Invoice, type Order, OrderLine, Run } from '@/models'
import type { InvoiceLine } from '@/models/json'

/**
 * The paper of a posted order: every line and the postage, a reduction where part of the money went back before, and the
 * papers of its payments taken off again, so that only what they did not charge is charged.
 * Units:   `heldMinor` is what the ledger still holds of the buyer's money for it.
 * The caller has locked the order. Writes: one invoice. Repeat: issues another; called once, at the posting.
 */
export async function issueFinal(
  tx: Transaction,
  { order, heldMinor, now }: { order: Order; heldMinor: number; now: Date },
): Promise<Invoice> {
  const standing = (await standingInvoices(tx, order.id)).filter(({ left }) => left.length > 0)
  const lines = [
    ...(await goodsOf(tx, order)),
    ...(await reductionOf(tx, order, heldMinor, standing)),
    ...standing.flatMap(setOff),
  ]
  return issueInvoice(tx, { kind: 'final', order, lines, now })
}

async function goodsOf(tx: Transaction, order: Order): Promise<InvoiceLine[]> {
  const rows = await OrderLine.findAll({
    where: { orderId: order.id },
    order: [['position', 'ASC']],
    transaction: tx,
  })
  const run = await Run.findByPk(order.runId, { transaction: tx, rejectOnEmpty: true })
  const module = await Module.findByPk(run.moduleId, { transaction: tx, rejectOnEmpty: true })
  const goods = rows.map((row) => ({
    text: invoiceText.goods(
      module.name,
      row.offerKind,
      row.choices.map(({ label }) => label),
    ),
    quantity: row.quantity,
    unitMinor: minor(Math.round(row.totalMinor / row.quantity)),
    grossMinor: row.totalMinor,
    taxMinor: row.taxMinor,
    taxBasisPoints: row.taxBasisPoints,
  }))
  const { postageMinor: grossMinor, postageTaxMinor: taxMinor, postageTaxBasisPoints: basisPoints } = order
  const postage = lineOf(invoiceText.postage, { basisPoints, grossMinor, taxMinor })
  return grossMinor > 0 ? [...goods, postage] : goods
}

/** Money that went back before the posting was no price: it lessens the order, never below what was charged already. */
async function reductionOf(
  tx: Transaction,
  order: Order,
  heldMinor: number,
  standing: readonly StandingInvoice[],
): Promise<InvoiceLine[]> {
  if (heldMinor === order.totalMinor) return []
  const whole = await partsOfOrder(tx, order)
  const charged = taxParts(standing.filter((each) => !each.isTaxedLater).flatMap(({ left }) => left))
  const kept = partsOfPayment({ whole, before: [], amount: heldMinor }).map((part) => ({
    ...part,
    taxMinor: minor(
      Math.max(part.taxMinor, taxOf(charged.filter(({ basisPoints }) => basisPoints === part.basisPoints))),
    ),
  }))
  return lessParts(kept, whole)
    .filter(({ grossMinor, taxMinor }) => grossMinor !== 0 || taxMinor !== 0)
    .map((part) => lineOf(invoiceText.reduced, part))
}

function setOff({ invoice, left, isTaxedLater }: StandingInvoice): InvoiceLine[] {
  const text = invoiceText.setOff(invoice.number, writtenDay(invoice.issuedOn))
  return lessParts([], left).map((part) =>
    lineOf(text, part, isTaxedLater ? { setsOff: true, isTaxedLater } : { setsOff: true }),
  )
}
