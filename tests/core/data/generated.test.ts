import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { COUNTRIES } from '@/lib/core/data/countries'
import { countryName, isCountry } from '@/lib/core/data/country'
import { EU_MEMBERS, isEuMember } from '@/lib/core/data/eu-members'
import { countriesSource } from '../../../scripts/data/countries'
import { currenciesSource } from '../../../scripts/data/currencies'

const stored = (file: string) =>
  readFileSync(join(import.meta.dirname, '../../../lib/core/data', file), 'utf8')

describe('generated data', () => {
  test.each([
    ['currencies.ts', currenciesSource, 'currency-codes 2.2.0', '2024-06-25'],
    ['countries.ts', countriesSource, 'i18n-iso-countries 7.14.0', '2025-07-17'],
  ])('%s is what its script makes, and names package, version and date', (file, source, origin, date) => {
    expect(stored(file)).toBe(source())
    expect(stored(file)).toContain(origin)
    expect(stored(file)).toContain(date)
  })
})

describe('countries', () => {
  test('249 alpha-2 codes are assigned (ISO 3166-1)', () => {
    expect(Object.keys(COUNTRIES)).toHaveLength(249)
  })

  test('alpha-3 and numeric codes are distinct and well formed', () => {
    const all = Object.values(COUNTRIES)
    expect(new Set(all.map((each) => each.alpha3)).size).toBe(249)
    expect(new Set(all.map((each) => each.numeric)).size).toBe(249)
    expect(all.every((each) => /^[A-Z]{3}$/.test(each.alpha3) && /^\d{3}$/.test(each.numeric))).toBe(true)
  })

  // ISO 3166-1, known entries.
  test.each([
    ['DE', 'DEU', '276', 'Germany'],
    ['GB', 'GBR', '826', 'United Kingdom'],
    ['JP', 'JPN', '392', 'Japan'],
    ['US', 'USA', '840', 'United States of America'],
    ['CH', 'CHE', '756', 'Switzerland'],
  ] as const)('%s', (code, alpha3, numeric, name) => {
    expect(COUNTRIES[code]).toEqual({ alpha3, numeric, name })
    expect(countryName(code)).toBe(name)
  })

  test.each(['UK', 'EU', 'XK', 'de', '', 'DEU', 'constructor'])('%j is not assigned', (code) => {
    expect(isCountry(code)).toBe(false)
    expect(() => countryName(code)).toThrow(RangeError)
  })

  test('the Union has 27 members, all of them countries', () => {
    expect(new Set(EU_MEMBERS).size).toBe(27)
    expect(EU_MEMBERS.every(isCountry)).toBe(true)
    expect(['GB', 'CH', 'NO'].some(isEuMember)).toBe(false)
  })
})
