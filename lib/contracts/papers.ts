import type { OfferKind } from '@/lib/contracts/fields'
import type { SlipLanguage } from '@/lib/core/post/slip-language'
import type { Day } from '@/lib/core/brand'
import type { CustomsLine, DeclarationProblem } from '@/lib/core/post/customs'

export type PaperSize = 'A4' | 'Letter'
export type LabelSize = 'A6' | '100x150' | '4x6' | 'roll62'

/** What stands in the title block of every sheet beside "sheet n of m". */
export type PaperIssue = {
  workshop: string
  /** Who had it made. */
  printedBy: string
  printedOn: Day
  size: PaperSize | LabelSize
}

/** One thing to be put into a parcel, as it was ordered. */
export type PaperLine = {
  module: string
  offer: OfferKind
  quantity: number
  /** Answers in words, such as `Front panel finish: sand`. */
  choices: readonly string[]
  /** Serial numbers of the very pieces; empty where none are recorded. */
  serials: readonly string[]
  /** Where finished ones stand on the shelf; empty or left out if nowhere. */
  place?: string
}

export type FulfilmentOrder = {
  /** What people quote and scanners read. */
  number: string
  name: string
  /** ISO 3166-1 alpha-2. */
  country: string
  postedBy: Day
  lines: readonly PaperLine[]
  /** Something to mind, in the workshop's words; null if nothing. */
  note: string | null
}

/** Orders in the order of packing: oldest promise first. Orders of the same contents are put together on the paper. */
export type FulfilmentList = PaperIssue & {
  /** What the list is of, such as `Fairlead, revision B, run 1`. */
  title: string
  orders: readonly FulfilmentOrder[]
}

export type PackingSlip = {
  orderNumber: string
  /** This parcel among those of the order, both from 1. */
  parcel: { nth: number; of: number }
  isReplacement: boolean
  /** Of its fixed words. */
  language: SlipLanguage
  /** Lines of the label in Latin letters, with the country line. */
  to: readonly string[]
  /** The same in the buyer's own script; null where it is the same. */
  toOwnScript: readonly string[] | null
  lines: readonly PaperLine[]
  /** Where a problem is reported, to be typed by hand. */
  problemUrl: string
}

export type PackingSlips = PaperIssue & {
  /** Sender and return address. */
  from: readonly string[]
  slips: readonly PackingSlip[]
}

/** A line of an invoice; sums with tax in minor units. Papers set off have negative ones. */
export type InvoicePaperLine = {
  text: string
  quantity: number
  unitMinor: number
  grossMinor: number
  taxMinor: number
  taxBasisPoints: number
  setsOff: boolean
}

/** An invoice or credit note as printed. */
export type InvoicePaper = Omit<PaperIssue, 'printedBy' | 'printedOn'> & {
  kind: 'prepayment' | 'final' | 'credit_note'
  number: number
  orderNumber: number
  issuedOn: Day
  /** The paper a credit note takes back. */
  corrects: { number: number; issuedOn: Day } | null
  seller: { name: string; lines: readonly string[]; taxNumber: string | null; taxNote: string | null }
  buyer: readonly string[]
  buyerVatNumber: string | null
  currency: string
  locale: string
  taxCountry: string
  /** Tax falls due with the posting: said on the paper. */
  isTaxedLater: boolean
  lines: readonly InvoicePaperLine[]
}

/** An invoice or credit note as a page lists it. */
export type InvoiceView = {
  id: string
  kind: InvoicePaper['kind']
  number: number
  issuedOn: Day
  grossMinor: number
  taxMinor: number
  currency: string
}

/** What customs must know of a parcel; `form` none: it crosses no customs border. */
export type ParcelCustoms = {
  form: 'none' | 'CN22' | 'CN23'
  lines: readonly CustomsLine[]
  valueMinor: number
  currency: string
  /** What is missing before it may be labelled, worst first. */
  problems: readonly DeclarationProblem[]
  /** Who pays what falls due on arrival. */
  duties: 'none' | 'buyer_pays' | 'prepaid' | 'refused'
}

/** Everything the papers of one parcel state. */
export type ParcelPaper = {
  parcel: string
  number: number
  orderNumber: string
  place: { nth: number; of: number }
  isReplacement: boolean
  /** Label lines in Latin letters, with the country line. */
  to: readonly string[]
  toOwnScript: readonly string[] | null
  country: string
  phone: string | null
  taxNumber: string | null
  service: string | null
  tracking: string | null
  /** On the scale, or what it should weigh; null where nobody knows. */
  grams: number | null
  lines: readonly PaperLine[]
  customs: ParcelCustoms
}

/** Papers of parcels, and what every one of them says of its maker. */
export type ParcelPapers = Omit<PaperIssue, 'size'> & {
  from: readonly string[]
  fromPhone: string | null
  fromTaxNumber: string | null
  parcels: readonly ParcelPaper[]
}

/** What goes into one bag of a kit, and how many such bags. */
export type BagList = {
  what: string
  choices: readonly string[]
  bags: number
  parts: readonly { quantity: number; name: string; value: string; place: string; designators: string }[]
}
