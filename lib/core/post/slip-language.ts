/** Languages the fixed words of a packing slip are in. */
export type SlipLanguage = 'en' | 'de' | 'fr' | 'es'

const SPOKEN: Readonly<Record<string, SlipLanguage>> = {
  ...Object.fromEntries(['DE', 'AT', 'LI', 'CH'].map((country) => [country, 'de'])),
  ...Object.fromEntries(['FR', 'MC', 'LU'].map((country) => [country, 'fr'])),
  ...Object.fromEntries(
    ['ES', 'MX', 'AR', 'CL', 'CO', 'PE', 'UY', 'EC', 'CR'].map((country) => [country, 'es']),
  ),
}

/**
 * The language of the slip in a buyer's parcel: their own where the slip has it, else that of the country, else English.
 * Domain:  locale a BCP 47 tag; country ISO 3166-1 alpha-2. "en" is what nobody chose, so the country decides then.
 * Source:  own rule; of countries with several languages the one most of them read.
 * @example slipLanguage({ locale: 'en', country: 'AT' })  // → 'de'
 * @example slipLanguage({ locale: 'fr-CH', country: 'CH' })  // → 'fr'
 * @example slipLanguage({ locale: 'ja', country: 'JP' })  // → 'en'
 */
export function slipLanguage({
  locale,
  country,
}: {
  readonly locale: string
  readonly country: string
}): SlipLanguage {
  const own = locale.slice(0, 2).toLowerCase()
  if (own === 'de' || own === 'fr' || own === 'es') return own
  return own === 'en' ? (SPOKEN[country.toUpperCase()] ?? 'en') : 'en'
}
