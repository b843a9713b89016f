import { z } from 'zod'

const plainDigits = /^\d{1,15}$/

/**
 * A whole number in a closed range, from JSON or from a form field of plain digits. "1e3", "1.5" and " 2 4"
 * are refused rather than guessed at.
 */
export function wholeNumber(least: number, most: number, words?: string) {
  const sentence = words ?? `Enter a whole number from ${least} to ${most}.`
  return z
    .union([z.number(), z.string().trim().regex(plainDigits, sentence).transform(Number)], {
      error: sentence,
    })
    .pipe(z.number({ error: sentence }).int(sentence).min(least, sentence).max(most, sentence))
}

/** Whole minor units of a currency, from 0 to a million major units. */
export const minorAmount = (words = 'Enter an amount, such as 25.00.') =>
  wholeNumber(0, 100_000_000_000, words)

/** An e-mail address as typed; line breaks and control characters are refused, since mail headers are made of it. */
export const email = z
  .string({ error: 'Enter an e-mail address.' })
  .trim()
  .max(254, 'Enter an e-mail address of at most 254 characters.')
  .regex(
    /^[^\s\p{Cc}@]+@[^\s\p{Cc}@]+\.[^\s\p{Cc}@]+$/u,
    'Enter an e-mail address, such as name@example.org.',
  )

/** One line of text without control characters, trimmed, not empty. */
export function line(most: number, words = 'Fill this in.') {
  return z
    .string({ error: words })
    .trim()
    .min(1, words)
    .max(most, `Use at most ${most} characters.`)
    .regex(/^[^\p{Cc}]*$/u, 'Use one line of text, without line breaks.')
}

/** One optional line; an empty form field counts as left out. */
export function optionalLine(most: number) {
  return z.preprocess((typed) => (typed === '' || typed === null ? undefined : typed), line(most).optional())
}

/** Several lines of text, trimmed; carriage returns become plain line feeds. */
export function paragraphs(most: number, least = 0, words = 'Fill this in.') {
  return z
    .string({ error: words })
    .transform((typed) => typed.replaceAll('\r\n', '\n').trim())
    .pipe(z.string().min(least, words).max(most, `Use at most ${most} characters.`))
}

/** A calendar day that exists, 'YYYY-MM-DD'. */
export const day = (words = 'Enter a date, such as 2027-03-31.') => z.iso.date({ error: words })

/** ISO 3166-1 alpha-2 shape; whether it is assigned is asked of the core's table. */
export const countryCode = z
  .string({ error: 'Choose a country.' })
  .trim()
  .toUpperCase()
  .regex(/^[A-Z]{2}$/, 'Choose a country.')

/** The part of a page's address that names a workshop or a module. */
export const slug = z
  .string({ error: 'Choose a short name for the address.' })
  .trim()
  .toLowerCase()
  .regex(/^[a-z0-9](?:[a-z0-9-]{0,38}[a-z0-9])?$/, 'Use 1 to 40 small letters, digits and hyphens.')

/** A checkbox: true in JSON, "on" or "true" in a form, absent when not ticked. */
export const tick = z.preprocess((typed) => typed === true || typed === 'on' || typed === 'true', z.boolean())

/** The three forms in which a module is sold. */
export const offerKind = z.enum(['boards', 'kit', 'built'], { error: 'Choose one of the offers.' })
export type OfferKind = z.infer<typeof offerKind>

export const uuid = z.uuid('Unknown.')
/** Whether a part of a page's address can be an id at all; one that cannot names nothing. */
export const isUuid = (text: string): boolean => uuid.safeParse(text).success

/** A single-use secret of a mail's link: 43 characters of base64url (32 bytes). */
export const token = z
  .string({ error: 'The link is not complete.' })
  .regex(/^[A-Za-z0-9_-]{43}$/, 'The link is not complete.')
