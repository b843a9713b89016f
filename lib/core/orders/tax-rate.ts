import { isEuMember } from '@/lib/core/data/eu-members'

/** How a workshop deals with sales tax; chosen in its settings, explained there, and no tax advice. */
export type TaxMode = 'not_registered' | 'home_rate' | 'destination_rate' | 'export_without_tax'

/** A rate of a country and tax class from a day on. */
export type TaxRateFact = {
  readonly country: string
  readonly taxClass: string
  /** 19 % is 1900. */
  readonly basisPoints: number
  /** First day on which it holds, 'YYYY-MM-DD'. */
  readonly validFrom: string
}

/**
 * The rate that goes into a price for one destination on one day: nothing where the workshop is not registered or sells
 * for export only; the home rate, or the destination's, within the tax area (the own country, or all of the European
 * Union for a member); nothing for what leaves it.
 * Units:   basis points.
 * Domain:  any; a country without a known rate counts as 0.
 * Source:  own rule after Directive 2006/112/EC, articles 33, 58 and 146 (from memory); data with a date, check your local law.
 * @example taxRateFor({ mode: 'home_rate', home: 'DE', destination: 'FR', taxClass: 'standard', on: '2026-03-01', rates: [{ country: 'DE', taxClass: 'standard', basisPoints: 1900, validFrom: '2021-01-01' }] })  // → 1900
 * @example taxRateFor({ mode: 'home_rate', home: 'DE', destination: 'US', taxClass: 'standard', on: '2026-03-01', rates: [] })  // → 0
 */
export function taxRateFor(sale: {
  mode: TaxMode
  home: string
  destination: string
  taxClass: string
  on: string
  rates: readonly TaxRateFact[]
}): number {
  if (sale.mode === 'not_registered' || sale.mode === 'export_without_tax') return 0
  if (!isSameTaxArea(sale.home, sale.destination)) return 0
  const country = sale.mode === 'home_rate' ? sale.home : sale.destination
  const valid = sale.rates.filter(
    (rate) => rate.country === country && rate.taxClass === sale.taxClass && rate.validFrom <= sale.on,
  )
  const newest = valid.reduce<TaxRateFact | null>(
    (best, rate) => (best === null || rate.validFrom > best.validFrom ? rate : best),
    null,
  )
  return newest?.basisPoints ?? 0
}

/**
 * The country whose tax a sale bears: the destination's where its rate is charged within the tax area, else the own.
 * @example taxCountryOf({ mode: 'destination_rate', home: 'DE', destination: 'FR' })  // → 'FR'
 * @example taxCountryOf({ mode: 'destination_rate', home: 'DE', destination: 'US' })  // → 'DE'
 */
export function taxCountryOf(sale: { mode: TaxMode; home: string; destination: string }): string {
  const isThere = sale.mode === 'destination_rate' && isSameTaxArea(sale.home, sale.destination)
  return isThere ? sale.destination : sale.home
}

/**
 * Whether goods between two countries stay within one tax area.
 * @example isSameTaxArea('DE', 'FR')  // → true
 * @example isSameTaxArea('GB', 'FR')  // → false
 */
export function isSameTaxArea(home: string, destination: string): boolean {
  return home === destination || (isEuMember(home) && isEuMember(destination))
}
