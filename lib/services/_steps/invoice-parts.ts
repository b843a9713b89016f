import 'server-only'
import type { Transaction } from 'sequelize'
import { type TaxPart, lessParts, taxParts } from '@/lib/core/orders/tax-parts'
import { Invoice, type Order, OrderLine } from '@/models'
import type { InvoiceLine } from '@/models/json'

/** A paper and what of it no credit note has taken back yet. */
export type StandingInvoice = { invoice: Invoice; left: TaxPart[]; isTaxedLater: boolean }

const asTaxed = ({ taxBasisPoints, grossMinor, taxMinor }: InvoiceLine) => ({
  basisPoints: taxBasisPoints,
  grossMinor,
  taxMinor,
})

/** What a paper charges, by rate, before earlier papers are set off. */
export const partsOfInvoice = ({ lines }: Invoice): TaxPart[] =>
  taxParts(lines.filter(({ setsOff }) => !setsOff).map(asTaxed))

/**
 * The papers of an order that charge something, oldest first, each with what credit notes have left of it.
 * Locks: nothing; the order is locked by the caller. Writes: nothing.
 */
export async function standingInvoices(tx: Transaction, orderId: string): Promise<StandingInvoice[]> {
  const all = await Invoice.findAll({
    where: { orderId },
    order: [
      ['issuedAt', 'ASC'],
      ['number', 'ASC'],
    ],
    transaction: tx,
  })
  return all
    .filter(({ kind }) => kind !== 'credit_note')
    .map((invoice) => ({
      invoice,
      left: all
        .filter(({ correctsInvoiceId }) => correctsInvoiceId === invoice.id)
        .reduce((left, note) => lessParts(left, partsOfInvoice(note)), partsOfInvoice(invoice)),
      isTaxedLater: invoice.lines.some(({ isTaxedLater }) => isTaxedLater),
    }))
}

/** The whole of an order by rate: its lines and its postage. Locks, writes: nothing. */
export async function partsOfOrder(tx: Transaction, order: Order): Promise<TaxPart[]> {
  const lines = await OrderLine.findAll({ where: { orderId: order.id }, transaction: tx })
  const postage = {
    basisPoints: order.postageTaxBasisPoints,
    grossMinor: order.postageMinor,
    taxMinor: order.postageTaxMinor,
  }
  return taxParts([
    ...lines.map((line) => ({
      basisPoints: line.taxBasisPoints,
      grossMinor: line.totalMinor,
      taxMinor: line.taxMinor,
    })),
    ...(order.postageMinor > 0 ? [postage] : []),
  ])
}

/** A rate's part as a line of a paper. */
export const lineOf = (
  text: string,
  { basisPoints, grossMinor, taxMinor }: TaxPart,
  more: Pick<InvoiceLine, 'setsOff' | 'isTaxedLater'> = {},
): InvoiceLine => ({
  text,
  quantity: 1,
  unitMinor: grossMinor,
  grossMinor,
  taxMinor,
  taxBasisPoints: basisPoints,
  ...more,
})
