import { z } from 'zod'
import { isCurrency } from '@/lib/core/money/currency'
import { parseMoney } from '@/lib/core/money/parse'
import { readShare } from '@/lib/core/plain/share'
import { readUnitPrice } from '@/lib/core/plain/unit-price'

/** A share typed as a percentage; basis points afterwards. Left empty it is `otherwise`. */
export const percent = (otherwise = '0') =>
  z.preprocess(
    (typed) => (typed === '' || typed === undefined || typed === null ? otherwise : String(typed)),
    z.string().transform((typed, check) => {
      const share = readShare(typed)
      if (share.ok) return share.value
      check.addIssue({ code: 'custom', message: 'Enter a percentage from 0 to 100, such as 2.5.' })
      return z.NEVER
    }),
  )

export const currencyCode = z
  .string({ error: 'Enter a currency by its three letters.' })
  .trim()
  .toUpperCase()
  .refine((code) => isCurrency(code), 'Enter a currency by its three letters, such as EUR.')

/** A decimal as people type it, such as an average or a rate; a string with a point afterwards. */
export const decimal = (words: string) =>
  z
    .string({ error: words })
    .trim()
    .regex(/^\d{1,9}([.,]\d{1,9})?$/, words)
    .transform((typed) => typed.replace(',', '.'))

/** An amount of the row's own currency as people write it; minor units afterwards, a sentence at `path` otherwise. */
export function amountIn(
  currency: string,
  typed: string | undefined,
  path: string,
  check: z.RefinementCtx,
): number {
  const text = typed?.trim() ?? ''
  if (text === '') return 0
  const amount = isCurrency(currency) ? parseMoney(text, currency) : null
  if (amount?.ok && amount.value >= 0 && amount.value <= 100_000_000_000) return amount.value
  if (amount) check.addIssue({ code: 'custom', path: [path], message: 'Enter an amount, such as 25.00.' })
  return 0
}

/** A price of one piece in a currency; a decimal string of minor units afterwards. */
export function unitPriceIn(
  currency: string,
  typed: string | undefined,
  path: string,
  check: z.RefinementCtx,
): string {
  const text = typed?.trim() ?? ''
  if (text === '' || !isCurrency(currency)) return '0'
  const price = readUnitPrice(text, currency)
  if (price.ok) return price.value
  check.addIssue({ code: 'custom', path: [path], message: 'Enter a price, such as 0.85.' })
  return '0'
}
