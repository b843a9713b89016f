import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day, Minor } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { day, json, key, moment, money, optional, preset, ref, table, text, whole } from './columns'
import type { InvoiceLine, InvoiceSeller } from './json'
import type { Order } from './order'
import type { InvoiceKind, InvoiceSeries } from './words'

/** A numbered paper of the books: prepayment invoice, final invoice or credit note. Never changed. */
export class Invoice extends Model<InferAttributes<Invoice>, InferCreationAttributes<Invoice>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** What it is. */
  declare kind: InvoiceKind
  /** Whose numbers it takes. */
  declare series: InvoiceSeries
  /** Counts up from 1 without a gap within workshop and series. */
  declare number: number
  /** The order. */
  declare orderId: string
  /** The payment it is for; null where none moved. */
  declare attemptId: string | null
  /** The repayment a credit note is for; null otherwise. */
  declare refundId: string | null
  /** The invoice a credit note corrects; null otherwise. */
  declare correctsInvoiceId: string | null
  /** Address of the buyer on it; null if there is none. */
  declare addressId: string | null
  /** Currency of the sums. */
  declare currency: string
  /** Sum without tax, before earlier papers are set off. */
  declare netMinor: Minor
  /** Tax, before earlier papers are set off. */
  declare taxMinor: Minor
  /** Sum with tax, before earlier papers are set off. */
  declare grossMinor: Minor
  /** Country whose tax it is. */
  declare taxCountry: string
  /** What is charged, line by line, with rate and tax. */
  declare lines: InvoiceLine[]
  /** Who sold, as it was on the day of issue. */
  declare seller: CreationOptional<Partial<InvoiceSeller>>
  /** Day of issue in the workshop's zone. */
  declare issuedOn: Day
  /** When it was issued (business time). */
  declare issuedAt: Date

  declare order?: NonAttribute<Order>
}

Invoice.init(
  {
    id: key(),
    workshopId: ref(),
    kind: text(),
    series: text(),
    number: whole(),
    orderId: ref(),
    attemptId: optional(ref()),
    refundId: optional(ref()),
    correctsInvoiceId: optional(ref()),
    addressId: optional(ref()),
    currency: text(),
    netMinor: money(),
    taxMinor: money(),
    grossMinor: money(),
    taxCountry: text(),
    lines: json(),
    seller: preset(json(), {}),
    issuedOn: day(),
    issuedAt: moment(),
  },
  table(sequelize, 'Invoice', 'invoices'),
)
