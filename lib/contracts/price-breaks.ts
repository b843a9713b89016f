import { readUnitPrice, writeUnitPrice } from '@/lib/core/plain/unit-price'
import { ok, refuse, type Result } from '@/lib/core/result'

/** The price of one from a quantity on; `unitPrice` in minor units, a decimal string. */
export type PriceBreak = { from: number; unitPrice: string }

/** What is wrong with a line of price breaks. */
export const PRICE_BREAKS_WORDS = {
  unreadable: 'Enter quantities with the price of one from there on, such as 1: 0.12; 100: 0.09.',
  out_of_order: 'Enter the quantities rising, each once: 1: 0.12; 100: 0.09.',
} as const

/**
 * Price breaks as one line of text, rising by quantity.
 * Refuses: 'unreadable' for anything else beside them, or none at all; 'out_of_order' where a quantity is not above the one
 * before it: a slip of the hand would otherwise become a price.
 * @example readBreaks('1: 0.12; 100: 0.09', 'EUR')  // → ok([{ from: 1, unitPrice: '12' }, { from: 100, unitPrice: '9' }])
 */
export function readBreaks(
  text: string,
  currency: string,
): Result<PriceBreak[], 'unreadable' | 'out_of_order'> {
  const pattern = /([0-9]{1,9})\s*[:=]\s*([0-9]+(?:[.,][0-9]+)?)/g
  const rest = text.replace(pattern, '').replaceAll(/[\s;,/|]/g, '')
  const found = [...text.matchAll(pattern)].map(([, from, price]) => ({
    from: Number(from),
    unitPrice: readUnitPrice(price ?? '', currency),
  }))
  if (rest !== '' || found.length === 0 || found.length > 20) return refuse('unreadable')
  const breaks: PriceBreak[] = []
  for (const { from, unitPrice } of found) {
    if (!unitPrice.ok || from < 1) return refuse('unreadable')
    if ((breaks.at(-1)?.from ?? 0) >= from) return refuse('out_of_order')
    breaks.push({ from, unitPrice: unitPrice.value })
  }
  return ok(breaks)
}

/** The other way round. */
export const writeBreaks = (breaks: readonly PriceBreak[], currency: string): string =>
  breaks.map(({ from, unitPrice }) => `${from}: ${writeUnitPrice(unitPrice, currency)}`).join('; ')
