/** Parts of an address that a destination may need, one letter each: lines, city, region, postcode. */
type Parts = string

/** What a destination needs of an address (`needed`) and what it usually has (`usual`). */
export type RequiredFields = { readonly needed: Parts; readonly usual: Parts }

const cityAndPostcode = { needed: 'LCZ', usual: '' }

/**
 * Which parts an address to one of the forty destinations we price must have. Kept by hand; a destination that is not
 * here gets suggestions only. L lines, C city, S region, Z postcode.
 * Source: the `require` column of the open address data set libaddressinput (chromium-i18n), read in December 2026;
 * BG, CY, IS, MT and SI have none there: lines and city are the set's default, the postcode is only asked for.
 * Softer than the set where a good address may lack the part: the province of ES and IT follows from the postcode;
 * KR and TW addresses written in Latin letters often name the city alone.
 */
export const REQUIRED_FIELDS: Readonly<Record<string, RequiredFields>> = {
  AT: cityAndPostcode,
  AU: { needed: 'LCSZ', usual: '' },
  BE: cityAndPostcode,
  BG: { needed: 'LC', usual: 'Z' },
  BR: { needed: 'LCSZ', usual: '' },
  CA: { needed: 'LCSZ', usual: '' },
  CH: cityAndPostcode,
  CY: { needed: 'LC', usual: 'Z' },
  CZ: cityAndPostcode,
  DE: cityAndPostcode,
  DK: cityAndPostcode,
  EE: cityAndPostcode,
  ES: { needed: 'LCZ', usual: 'S' },
  FI: cityAndPostcode,
  FR: cityAndPostcode,
  GB: cityAndPostcode,
  GR: cityAndPostcode,
  HR: cityAndPostcode,
  HU: cityAndPostcode,
  IE: { needed: 'LC', usual: '' },
  IS: { needed: 'LC', usual: 'Z' },
  IT: { needed: 'LCZ', usual: 'S' },
  JP: { needed: 'LSZ', usual: '' },
  KR: { needed: 'LCZ', usual: 'S' },
  LT: cityAndPostcode,
  LU: cityAndPostcode,
  LV: cityAndPostcode,
  MT: { needed: 'LC', usual: 'Z' },
  NL: cityAndPostcode,
  NO: cityAndPostcode,
  NZ: cityAndPostcode,
  PL: cityAndPostcode,
  PT: cityAndPostcode,
  RO: cityAndPostcode,
  SE: cityAndPostcode,
  SG: { needed: 'LZ', usual: '' },
  SI: { needed: 'LC', usual: 'Z' },
  SK: cityAndPostcode,
  TW: { needed: 'LCZ', usual: 'S' },
  US: { needed: 'LCSZ', usual: '' },
}

/**
 * What customs of a destination want to know of a private addressee: asked for, never insisted on.
 * Source: from memory, common practice of posts: BR tax number (CPF), KR customs clearance code and telephone, TR and ID
 * identity number, AR tax number, CN and TW telephone. To be checked by the workshop.
 */
export const CUSTOMS_ASKS: Readonly<Record<string, readonly ('phone' | 'taxNumber')[]>> = {
  AR: ['taxNumber'],
  BR: ['taxNumber'],
  CN: ['phone'],
  ID: ['taxNumber'],
  KR: ['phone', 'taxNumber'],
  TR: ['taxNumber'],
  TW: ['phone'],
}
