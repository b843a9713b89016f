import 'server-only'
import type { InvoicePaper } from '@/lib/contracts/papers'
import { can, type Actor } from '@/lib/core/policy/can'
import { formatAddress } from '@/lib/core/post/address'
import { LETTER_COUNTRIES } from '@/lib/queries/packing/get-fulfilment-orders'
import { Address, Invoice, Order, Workshop } from '@/models'

/** An invoice as it is printed, for its buyer or its owner; null for everybody else. Five statements at most. */
export async function getInvoicePaper(asked: {
  actor: Actor
  invoiceId: string
}): Promise<InvoicePaper | null> {
  const invoice = await Invoice.findByPk(asked.invoiceId, { include: [{ model: Order, as: 'order' }] })
  const order = invoice?.order
  if (!invoice || !order) return null
  const { workshopId, personId } = order
  if (!can(asked.actor, 'invoice:read', { workshopId, personId })) return null
  const workshop = await Workshop.findByPk(workshopId, { rejectOnEmpty: true })
  const address = invoice.addressId === null ? null : await Address.findByPk(invoice.addressId)
  const corrects =
    invoice.correctsInvoiceId === null ? null : await Invoice.findByPk(invoice.correctsInvoiceId)
  return {
    workshop: workshop.name,
    size: LETTER_COUNTRIES.includes(workshop.country) ? 'Letter' : 'A4',
    kind: invoice.kind,
    number: invoice.number,
    orderNumber: order.number,
    issuedOn: invoice.issuedOn,
    corrects: corrects && { number: corrects.number, issuedOn: corrects.issuedOn },
    seller: { name: workshop.name, lines: [], taxNumber: null, taxNote: null, ...invoice.seller },
    buyer:
      address === null || address.erasedAt !== null
        ? []
        : formatAddress(address.facts(), { script: 'latin', from: workshop.country }),
    buyerVatNumber: address?.vatNumber ?? null,
    currency: invoice.currency,
    locale: workshop.locale,
    taxCountry: invoice.taxCountry,
    isTaxedLater: invoice.lines.some(({ isTaxedLater, setsOff }) => isTaxedLater && !setsOff),
    lines: invoice.lines.map(({ setsOff, isTaxedLater: _, ...line }) => ({
      ...line,
      setsOff: setsOff ?? false,
    })),
  }
}
