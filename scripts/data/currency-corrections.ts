/**
 * What changed in ISO 4217 after the list that the package carries (from memory of the amendments; each checked
 * against the minor units printed there). Withdrawn codes stay known, so that old amounts can still be read.
 */
export const CURRENCY_CORRECTIONS: readonly {
  code: string
  exponent: 0 | 2 | 3 | 4
  name: string
  source: string
}[] = [
  {
    code: 'XCG',
    exponent: 2,
    name: 'Caribbean Guilder',
    source: 'ISO 4217 amendment 176: replaces ANG from 2025-03-31 (from memory)',
  },
]

/**
 * Codes whose minor unit ISO 4217 gives as "N.A.": metals, bond market units, accounting units, testing and "no currency".
 * Nothing can be priced in them; the package prints 0 for them, which is not what the standard says.
 */
export const WITHOUT_MINOR_UNIT: readonly string[] = [
  'XAG',
  'XAU',
  'XBA',
  'XBB',
  'XBC',
  'XBD',
  'XDR',
  'XPD',
  'XPT',
  'XSU',
  'XTS',
  'XUA',
  'XXX',
]
