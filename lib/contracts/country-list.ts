import { COUNTRIES } from '@/lib/core/data/countries'
import { isCountry } from '@/lib/core/data/country'

const byName = new Map(Object.entries(COUNTRIES).map(([code, { name }]) => [name.toLowerCase(), code]))

/**
 * Countries typed as a list of codes or English names between commas or on lines of their own. '*' alone stands for every
 * country no other zone names, 'EU' for the member states no other zone names.
 */
export function countriesOf(typed: string): { ok: true; value: string[] } | { ok: false; words: string } {
  const entries = typed
    .split(/[,;\n]/)
    .flatMap((each) =>
      /^\s*(?:[A-Za-z]{2}\s+)+[A-Za-z]{2}\s*$/.test(each) ? each.trim().split(/\s+/) : [each],
    )
    .map((each) => each.trim())
    .filter((each) => each !== '')
  if (entries.length === 0)
    return { ok: false, words: 'Name at least one country, or * for everywhere else.' }
  const found = new Set<string>()
  for (const entry of entries) {
    const code = entry.toUpperCase()
    const known = code === '*' || code === 'EU' || isCountry(code) ? code : byName.get(entry.toLowerCase())
    if (known === undefined)
      return {
        ok: false,
        words: `“${entry.slice(0, 40)}” is not a country we know. Use its two-letter code.`,
      }
    found.add(known)
  }
  if (found.has('*') && found.size > 1)
    return { ok: false, words: '* stands alone: it means every country no other zone names.' }
  return { ok: true, value: [...found] }
}
