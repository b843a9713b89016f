import 'server-only'
import type { Transaction } from 'sequelize'
import { minor } from '@/lib/core/brand'
import { taxCountryOf } from '@/lib/core/orders/tax-rate'
import { formatAddress } from '@/lib/core/post/address'
import { dayIn } from '@/lib/core/time/zone'
import { nextNumber } from '@/lib/services/_steps/next-number'
import { Invoice, type Order, Workshop } from '@/models'
import type { InvoiceLine } from '@/models/json'
import type { InvoiceKind } from '@/models/words'

type Wanted = {
  kind: InvoiceKind
  order: Order
  lines: InvoiceLine[]
  now: Date
  attemptId?: string | null
  refundId?: string | null
  /** The paper a credit note takes back, in part or whole. */
  corrects?: Invoice | null
}

/**
 * Issues a numbered paper of an order: the next number of its series, who sold and bought as they are today. What earlier
 * papers take off does not count in its own sums.
 * The caller has locked the order. Locks: the counter of the series, until the transaction ends, so that no number is left
 * out. Writes: one invoice, never changed. Repeat: issues another.
 */
export async function issueInvoice(tx: Transaction, wanted: Wanted): Promise<Invoice> {
  const { kind, order, lines, now, corrects = null } = wanted
  const workshop = await Workshop.findByPk(order.workshopId, { transaction: tx, rejectOnEmpty: true })
  const own = lines.filter(({ setsOff }) => !setsOff)
  const gross = own.reduce((sum, { grossMinor }) => sum + grossMinor, 0)
  const tax = own.reduce((sum, { taxMinor }) => sum + taxMinor, 0)
  const series = kind === 'credit_note' ? 'credit_note' : 'invoice'
  const { taxMode: mode, country: destination, currency, workshopId } = order
  return Invoice.create(
    {
      workshopId,
      kind,
      series,
      number: await nextNumber(tx, workshopId, series),
      orderId: order.id,
      attemptId: wanted.attemptId ?? null,
      refundId: wanted.refundId ?? null,
      correctsInvoiceId: corrects?.id ?? null,
      addressId: corrects?.addressId ?? order.addressId,
      currency: corrects?.currency ?? currency,
      netMinor: minor(gross - tax),
      taxMinor: minor(tax),
      grossMinor: minor(gross),
      taxCountry: corrects?.taxCountry ?? taxCountryOf({ mode, home: workshop.country, destination }),
      lines,
      seller: sellerOf(workshop),
      issuedOn: dayIn(now, workshop.timeZone),
      issuedAt: now,
    },
    { transaction: tx },
  )
}

function sellerOf(workshop: Workshop): Invoice['seller'] {
  const { postalAddress, taxNumber, taxNote } = workshop
  const name = workshop.legalName ?? workshop.name
  const lines = postalAddress ? formatAddress(postalAddress, { script: 'latin', from: '' }) : []
  return { name, lines: lines[0] === name ? lines.slice(1) : lines, taxNumber, taxNote }
}
