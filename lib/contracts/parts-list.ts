import { z } from 'zod'
import { day, wholeNumber } from './fields'
import { amountIn, currencyCode, percent } from './plan-fields'
import { PRICE_BREAKS_WORDS, readBreaks } from './price-breaks'
import { blank } from './rows'

/** Headings of a parts list as CSV; those in NEEDED_HEADINGS must be there, the rest may be left out. */
export const PART_HEADINGS = [
  ...['code', 'description', 'value', 'designators', 'per_unit', 'boards', 'kit', 'built'],
  ...['attrition_percent', 'attrition_least', 'needs_sample', 'lifecycle', 'supply_pins', 'polarity'],
  ...['supplier', 'currency', 'moq', 'multiple', 'setup', 'breaks', 'lead_days', 'quoted_on'],
  ...['stock_seen', 'stock_seen_on', 'choice', 'alternates'],
] as const
/** Headings of quotes as CSV, one line per quote: a part may stand there as often as it has been quoted. */
export const QUOTE_HEADINGS = [
  ...['code', 'supplier', 'supplier_code', 'currency', 'moq', 'multiple', 'setup', 'breaks'],
  ...['lead_days', 'quoted_on', 'stock_seen', 'stock_seen_on'],
] as const
export const NEEDED_HEADINGS: readonly string[] = ['code', 'per_unit']

const words = (most: number) => z.string().trim().max(most, `Use at most ${most} characters.`).default('')
const count = (most: number, otherwise: number) =>
  z.preprocess((typed) => (typed === '' || typed === undefined ? otherwise : typed), wholeNumber(0, most))
const atLeastOne = (most: number) =>
  z.preprocess((typed) => (typed === '' || typed === undefined ? 1 : typed), wholeNumber(1, most))
const yes = z
  .string()
  .trim()
  .toLowerCase()
  .default('')
  .pipe(z.enum(['', 'no', 'yes'], { error: 'Write yes or no.' }))
  .transform((typed) => typed === 'yes')
const placed = z
  .string()
  .trim()
  .toLowerCase()
  .default('')
  .pipe(
    z.enum(['', 'assembler', 'maker', 'buyer'], { error: 'Write assembler, maker or buyer, or nothing.' }),
  )

/** One line of a parts list, with at most one quote. */
export const PartRow = z
  .object({
    code: z
      .string({ error: 'Enter your code for the part.' })
      .trim()
      .min(1, 'Enter your code for the part.')
      .max(80),
    description: words(300),
    value: words(80),
    designators: words(4000),
    per_unit: wholeNumber(1, 10_000),
    boards: placed,
    kit: placed,
    built: placed,
    attrition_percent: percent(),
    attrition_least: count(10_000, 0),
    needs_sample: yes,
    lifecycle: z
      .string()
      .trim()
      .default('')
      .transform((typed) => (typed === '' ? 'active' : typed))
      .pipe(
        z.enum(['active', 'not_for_new_designs', 'last_buy', 'gone'], {
          error: 'Write active, not_for_new_designs, last_buy or gone.',
        }),
      ),
    supply_pins: count(200, 0),
    polarity: words(300),
    supplier: words(120),
    currency: blank(currencyCode),
    moq: atLeastOne(1_000_000),
    multiple: atLeastOne(1_000_000),
    setup: z.string().default(''),
    breaks: words(400),
    lead_days: blank(wholeNumber(0, 1000)),
    quoted_on: blank(day()),
    stock_seen: blank(wholeNumber(0, 100_000_000)),
    stock_seen_on: blank(day()),
    choice: words(80),
    alternates: words(400),
  })
  .transform((row, check) => {
    const { boards, kit, built } = row
    const placedBy = Object.fromEntries(
      Object.entries({ boards, kit, built }).filter(([, who]) => who !== ''),
    ) as Partial<Record<'boards' | 'kit' | 'built', 'assembler' | 'maker' | 'buyer'>>
    if (Object.keys(placedBy).length === 0)
      check.addIssue({
        code: 'custom',
        path: ['built'],
        message: 'Write assembler, maker or buyer for at least one offer.',
      })
    checkStockSeen(row, check)
    return {
      code: row.code,
      description: row.description,
      value: row.value,
      designators: row.designators,
      perUnit: row.per_unit,
      placedBy,
      attritionBasisPoints: row.attrition_percent,
      attritionAtLeast: row.attrition_least,
      needsSample: row.needs_sample,
      lifecycle: row.lifecycle,
      supplyPins: row.supply_pins,
      polarityNote: row.polarity,
      /** The answer of a choice that needs it, by its label; empty where every unit does. */
      choice: row.choice,
      /** Codes of parts that may stand in for it. */
      alternates: row.alternates
        .split(/[;,]/)
        .map((code) => code.trim())
        .filter((code) => code !== ''),
      quote: quoteOf(row, check),
    }
  })
export type PartRow = z.infer<typeof PartRow>

type Typed = {
  supplier: string
  supplier_code?: string
  currency?: string | undefined
  breaks: string
  quoted_on?: string | undefined
  setup: string
  moq: number
  multiple: number
  lead_days?: number | undefined
  stock_seen?: number | undefined
  stock_seen_on?: string | undefined
}

function checkStockSeen({ stock_seen: seen, stock_seen_on: on }: Typed, check: z.RefinementCtx): void {
  if ((seen === undefined) !== (on === undefined))
    check.addIssue({
      code: 'custom',
      path: ['stock_seen_on'],
      message: 'Enter the stock seen and the day together.',
    })
}

/** A quote of a part, by the part's code. */
export const QuoteRow = z
  .object({
    code: z
      .string({ error: 'Enter your code for the part.' })
      .trim()
      .min(1, 'Enter your code for the part.')
      .max(80),
    supplier: words(120),
    supplier_code: words(120),
    currency: blank(currencyCode),
    moq: atLeastOne(1_000_000),
    multiple: atLeastOne(1_000_000),
    setup: z.string().default(''),
    breaks: words(400),
    lead_days: blank(wholeNumber(0, 1000)),
    quoted_on: blank(day()),
    stock_seen: blank(wholeNumber(0, 100_000_000)),
    stock_seen_on: blank(day()),
  })
  .transform((row, check) => {
    checkStockSeen(row, check)
    const quote = quoteOf(row, check)
    if (row.supplier === '' && row.breaks === '')
      check.addIssue({ code: 'custom', path: ['supplier'], message: 'Enter the supplier.' })
    return { code: row.code, quote: quote ?? z.NEVER }
  })
export type QuoteRow = z.infer<typeof QuoteRow>

/** The quote of a line; null when the line names no supplier. */
function quoteOf(row: Typed, check: z.RefinementCtx) {
  const { supplier, currency, quoted_on: quotedOn } = row
  if (supplier === '' && row.breaks === '') return null
  if (supplier === '' || currency === undefined || quotedOn === undefined) {
    check.addIssue({
      code: 'custom',
      path: ['supplier'],
      message: 'A quote needs supplier, currency, breaks and quoted_on together.',
    })
    return null
  }
  const breaks = readBreaks(row.breaks, currency)
  if (!breaks.ok)
    check.addIssue({ code: 'custom', path: ['breaks'], message: PRICE_BREAKS_WORDS[breaks.reason] })
  return {
    supplier,
    supplierCode: row.supplier_code ?? '',
    currency,
    quotedOn,
    moq: row.moq,
    multiple: row.multiple,
    setupMinor: amountIn(currency, row.setup, 'setup', check),
    leadDays: row.lead_days ?? null,
    stockSeen: row.stock_seen ?? null,
    stockSeenOn: row.stock_seen_on ?? null,
    breaks: breaks.ok ? breaks.value : [],
  }
}
