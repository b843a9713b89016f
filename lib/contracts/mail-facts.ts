import { z } from 'zod'

/** Text that may stand in a header or a heading: no line break, no other control character. */
export const oneLine = (longest = 200) =>
  z
    .string()
    .min(1)
    .max(longest)
    .regex(/^[^\p{Cc}\u2028\u2029]+$/u, 'must be one line')

/** What a maker wrote: paragraphs are parted by an empty line; no markup is read from it. */
export const prose = (longest = 10_000) =>
  z
    .string()
    .min(1)
    .max(longest)
    .regex(/^[^\0]*$/, 'must not hold a NUL character')

/** An absolute address, made by the caller from lib/paths and the base URL. */
export const link = z.url({ protocol: /^https?$/ }).max(2000)
export const day = z.iso.date()
export const instant = z.iso.datetime()
export const currency = z.string().regex(/^[A-Z]{3}$/)
/** Spread beside every amount. */
export const money = { currency }

export const balanceWhen = z.enum(['at_lock', 'units_passed', 'before_packing'])

/** Whole minor units of the `currency` beside it. */
export const amountMinor = z.int().nonnegative()
export const count = z.int().nonnegative()

export const offer = z.enum(['boards', 'kit', 'built'])
/** The last four digits of a card, as the provider gives them. */
export const cardEnding = z
  .string()
  .regex(/^\d{4}$/)
  .nullable()

export const mailLine = z.strictObject({
  module: oneLine(),
  offer,
  quantity: z.int().positive(),
  choices: z.array(z.strictObject({ question: oneLine(), answer: oneLine() })).max(12),
})

/** One offer's promise: the last parcel of it is handed to the post by this day. */
export const offerPromise = z.strictObject({ offer, postedBy: day })

/** What every mail about an order names. `orderUrl` is the customer's own page of it. */
export const ofOrder = { orderNumber: oneLine(40), module: oneLine(), orderUrl: link }

export type MailLine = z.infer<typeof mailLine>
