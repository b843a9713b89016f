import type { Minor } from '@/lib/core/brand'
import type { OfferKind, TaxClass } from './words'

export type { FrontPanelControl, SpecificationLine } from '@/lib/contracts/front-panel'

/** Price of a weight: `upTo` grams, inclusive; tax as the workshop's prices. */
export type PostageBand = { upTo: number; priceMinor: Minor }

/** What the postage of an order was quoted from. */
export type PostageQuote = {
  zoneId: string
  serviceId: string
  serviceName: string
  grams: number
  priceMinor: Minor
}

/** An answer as it stood when it was given. `isDefault`: nobody chose it, it stands in. */
export type ChosenAnswer = {
  choiceId: string
  question: string
  answerId: string
  label: string
  surchargeMinor: Minor
  isDefault: boolean
}

/** What a line of a changed order is agreed at. */
export type AgreedLine = {
  offerKind: OfferKind
  unitPriceMinor: Minor
  unitSurchargeMinor: Minor
  unitDepositMinor: Minor
  taxClass: TaxClass
  taxBasisPoints: number
  taxMinor: Minor
  postedByOn: string
}

/** All sums of an order, as they are fixed together. */
export type OrderSums = {
  goodsMinor: Minor
  postageMinor: Minor
  postageQuote: PostageQuote
  postageTaxBasisPoints: number
  postageTaxMinor: Minor
  taxMinor: Minor
  totalMinor: Minor
  depositMinor: Minor
  balanceMinor: Minor
}

/** Lines and sums of an order, as a change found or left them; `agreed` and `sums` are there for what is to come. */
export type OrderTerms = {
  lines: {
    runOfferId: string
    quantity: number
    totalMinor: Minor
    choices: ChosenAnswer[]
    agreed?: AgreedLine
  }[]
  sums?: OrderSums
  addressId: string | null
  postageMinor: Minor
  taxMinor: Minor
  totalMinor: Minor
  depositMinor: Minor
}

/** One difference between the ledger and the provider's list; ids and sums only. */
export type ReconciliationDifference = {
  kind: 'missing_here' | 'missing_there' | 'amount' | 'currency'
  /** The provider's id of the payment, repayment or payout. */
  id: string
  /** It is the fee of that payment (a dispute's sum with it), not the payment itself. */
  isFee: boolean
  ours: { amount: number; currency: string } | null
  theirs: { amount: number; currency: string } | null
}

/** Who sold, as printed on the day of issue. */
export type InvoiceSeller = {
  name: string
  lines: string[]
  taxNumber: string | null
  /** The sentence the law wants where no tax is charged. */
  taxNote: string | null
}

/**
 * A line of an invoice; `unitMinor` and `grossMinor` with tax. `setsOff`: it takes an earlier paper off again, with
 * negative sums. `isTaxedLater`: its tax falls due at the posting, so this paper counts in no tax report.
 */
export type InvoiceLine = {
  setsOff?: boolean
  isTaxedLater?: boolean
  text: string
  quantity: number
  unitMinor: Minor
  grossMinor: Minor
  taxMinor: Minor
  taxBasisPoints: number
}

/** A step of a test plan; limits are closed and in `unit`, decimal strings. */
export type TestStep = {
  key: string
  setUp: string
  measure: string
  kind: 'measure' | 'yes_no' | 'text'
  low: string | null
  high: string | null
  unit: string | null
  caution: string | null
}

/** A step of a schedule; working days. */
export type PlanStep = {
  id: string
  name: string
  optimistic: number
  likely: number
  pessimistic: number
  after: string[]
  /** Offers that need it; left out or empty: all. */
  offers?: OfferKind[]
  /** First and last day on which whoever does it is closed; both or none. */
  closedFrom?: string | null
  closedTo?: string | null
}

/** Who places a part, per offer that needs it. */
export type PlacedByOffer = { [K in OfferKind]?: 'assembler' | 'maker' | 'buyer' }

/** How a lot was judged: the plan, and the defects found. */
export type SamplingRecord = {
  level: string
  aqlPercent: number
  sample: number
  accept: number
  inspectAll: boolean
  defects: number
}

/** A size and format made of a stored picture. */
export type FileVariant = {
  sha256: string
  mediaType: string
  widthPx: number
  heightPx: number
  byteCount: number
}
