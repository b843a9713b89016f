/**
 * Standard rates everybody starts from, in basis points, with the first day they are known to hold here. Data with a date:
 * a workshop's own rate goes before these, and each owner checks the local law.
 * Source: two open data sets of European rates agreed on each of these in August 2025.
 */
export const STANDARD_RATES: Readonly<Record<string, number>> = {
  ...{ AT: 2000, BE: 2100, BG: 2000, CY: 1900, CZ: 2100, DE: 1900, DK: 2500, EE: 2400, ES: 2100, FI: 2550 },
  ...{ FR: 2000, GR: 2400, HR: 2500, HU: 2700, IE: 2300, IT: 2200, LT: 2100, LU: 1700, LV: 2100, MT: 1800 },
  ...{ NL: 2100, PL: 2300, PT: 2300, RO: 2100, SE: 2500, SI: 2200, SK: 2300 },
  ...{ GB: 2000, NO: 2500, CH: 810 },
}
export const RATES_FROM = '2025-08-01'
export const RATES_SOURCE = 'Two open data sets, August 2025. Check your local law.'
