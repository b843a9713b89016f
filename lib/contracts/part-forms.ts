import { z } from 'zod'
import { day, line, optionalLine, uuid, wholeNumber, type OfferKind } from './fields'
import { amountIn, currencyCode } from './plan-fields'
import { PRICE_BREAKS_WORDS, readBreaks } from './price-breaks'
import { blank } from './rows'

const atLeastOne = z.preprocess(
  (typed) => (typed === '' || typed === undefined ? 1 : typed),
  wholeNumber(1, 1_000_000),
)

/** A quote of one part, written down by hand. */
export const QuoteInput = z
  .object({
    part: uuid,
    supplier: line(120, 'Enter the supplier.'),
    supplierCode: optionalLine(120),
    currency: currencyCode,
    moq: atLeastOne,
    multiple: atLeastOne,
    setup: z.string().max(30).default(''),
    breaks: line(400, PRICE_BREAKS_WORDS.unreadable),
    leadDays: blank(wholeNumber(0, 1000, 'Enter whole days, from 0 to 1000.')),
    quotedOn: day('Enter the day of the quote.'),
    stockSeen: blank(wholeNumber(0, 100_000_000, 'Enter whole pieces, 0 or more.')),
  })
  .transform(({ breaks, setup, stockSeen, ...quote }, check) => {
    const read = readBreaks(breaks, quote.currency)
    if (!read.ok)
      check.addIssue({ code: 'custom', path: ['breaks'], message: PRICE_BREAKS_WORDS[read.reason] })
    return {
      part: quote.part,
      quote: {
        supplier: quote.supplier,
        supplierCode: quote.supplierCode ?? '',
        currency: quote.currency,
        quotedOn: quote.quotedOn,
        moq: quote.moq,
        multiple: quote.multiple,
        setupMinor: amountIn(quote.currency, setup, 'setup', check),
        leadDays: quote.leadDays ?? null,
        stockSeen: stockSeen ?? null,
        stockSeenOn: stockSeen === undefined ? null : quote.quotedOn,
        breaks: read.ok ? read.value : [],
      },
    }
  })
export type QuoteInput = z.infer<typeof QuoteInput>

/** What was counted in the drawer. */
export const StockInput = z.object({
  part: uuid,
  onHand: wholeNumber(0, 10_000_000, 'Enter whole pieces, 0 or more.'),
  note: optionalLine(300),
})
export type StockInput = z.infer<typeof StockInput>

/** A part that may stand in for another, by its code. */
export const AlternateInput = z.object({
  part: uuid,
  code: line(80, 'Enter the code of the other part.'),
  note: optionalLine(500),
})
export type AlternateInput = z.infer<typeof AlternateInput>
export const AlternateRemoval = z.object({ part: uuid, alternate: uuid })

export type QuoteView = {
  id: string
  supplier: string
  supplierCode: string
  currency: string
  quotedOn: string
  ageDays: number
  moq: number
  multiple: number
  setupMinor: number
  breaks: { from: number; unitPrice: string }[]
  leadDays: number | null
  stockSeen: number | null
  stockSeenOn: string | null
}

/** A part as its owner keeps it: who sells it, how much lies here, what may stand in for it. */
export type PartDesk = {
  id: string
  code: string
  value: string
  description: string
  lifecycle: 'active' | 'not_for_new_designs' | 'last_buy' | 'gone'
  onHand: number
  quotes: QuoteView[]
  alternates: { id: string; code: string; value: string; note: string; onHand: number }[]
  /** The revisions of this module that use it. */
  usedIn: { letter: string; perUnit: number; placedBy: Partial<Record<OfferKind, string>> }[]
  sample: {
    state: 'not_needed' | 'open' | 'fits' | 'does_not_fit'
    on: string | null
    note: string | null
  }
}
