import { plainMoney } from '@/lib/core/money/plain'

/**
 * What stands in a database as the fields of a form, by dotted name; `fieldsToBody` reads them back. With a currency,
 * amounts ending in `Minor` are written as people write them. Nothing stands for null, false and what is left out.
 * @example formValues({ lines: [{ priceMinor: 950 }] }, 'EUR')  // → { 'lines.0.priceMinor': '9.50' }
 */
export function formValues(body: unknown, currency?: string): Record<string, string> {
  return Object.fromEntries(pairs(body, '', currency))
}

function pairs(value: unknown, name: string, currency: string | undefined): [string, string][] {
  if (value === null || value === undefined || value === false) return []
  if (value === true) return [[name, 'on']]
  if (typeof value !== 'object') {
    const isAmount = currency !== undefined && name.endsWith('Minor') && typeof value === 'number'
    return [[name, isAmount ? plainMoney(value, currency) : String(value)]]
  }
  return Object.entries(value).flatMap(([key, each]) => pairs(each, name ? `${name}.${key}` : key, currency))
}
