import fc from 'fast-check'
import { formatAddress as otherWay } from 'localized-address-format'
import { describe, expect, test } from 'vitest'
import { ADDRESS_FORMATS } from '@/lib/core/data/address-formats'
import { addressProblems, formatAddress, type Address } from '@/lib/core/post/address'
import { REQUIRED_FIELDS } from '@/lib/core/post/required-fields'

const hana: Address = {
  country: 'JP',
  name: '森 花',
  organization: '波止場工房',
  lines: ['神宮前1-2-3', '灯台荘202'],
  city: '渋谷区',
  region: '東京都',
  postcode: '150-0001',
  latin: { name: 'Hana Mori', lines: ['1-2-3 Jingumae', 'Todaiso 202'], city: 'Shibuya-ku', region: 'TOKYO' },
}
const errors = (address: Address) => addressProblems(address).filter(({ severity }) => severity === 'error')

describe('formatAddress', () => {
  test('a Japanese address in its own script runs from the largest to the smallest', () =>
    expect(formatAddress(hana, { script: 'own', from: 'DE' })).toEqual([
      '〒150-0001',
      '東京都渋谷区',
      '神宮前1-2-3',
      '灯台荘202',
      '波止場工房',
      '森 花',
      'JAPAN',
    ]))

  test('and in Latin letters from the smallest to the largest', () =>
    expect(formatAddress(hana, { script: 'latin', from: 'DE' })).toEqual([
      'Hana Mori',
      '1-2-3 Jingumae',
      'Todaiso 202, Shibuya-ku, TOKYO',
      '150-0001',
      'JAPAN',
    ]))

  // Line order: libaddressinput, as in the package localized-address-format.
  test.each<[Partial<Address> & { country: string }, string[]]>([
    [
      { country: 'US', city: 'Salem', region: 'OR', postcode: '97301' },
      ['A. Lee', '1 Low Rd', 'Salem, OR 97301', 'UNITED STATES OF AMERICA'],
    ],
    [
      { country: 'GB', city: 'Hull', postcode: 'HU1 1AA' },
      ['A. Lee', '1 Low Rd', 'Hull', 'HU1 1AA', 'UNITED KINGDOM'],
    ],
    [{ country: 'SE', city: 'Lund', postcode: '221 00' }, ['A. Lee', '1 Low Rd', 'SE-221 00 Lund', 'SWEDEN']],
    [
      { country: 'SE', city: 'Lund', postcode: 'SE-221 00' },
      ['A. Lee', '1 Low Rd', 'SE-221 00 Lund', 'SWEDEN'],
    ],
    [{ country: 'HU', city: 'Pécs', postcode: '7621' }, ['A. Lee', 'Pécs', '1 Low Rd', '7621', 'HUNGARY']],
    [
      { country: 'SG', city: 'Singapore', postcode: '308125' },
      ['A. Lee', '1 Low Rd', 'SINGAPORE 308125', 'SINGAPORE'],
    ],
    [{ country: 'SG' }, ['A. Lee', '1 Low Rd', 'SINGAPORE', 'SINGAPORE']],
    [{ country: 'RO', city: 'Cluj', postcode: '400001' }, ['A. Lee', '1 Low Rd', '400001 Cluj', 'ROMANIA']],
    [{ country: 'CH', city: 'Chur' }, ['A. Lee', '1 Low Rd', 'Chur', 'SWITZERLAND']],
    [{ country: 'TR', city: 'Foça', postcode: '35680' }, ['A. Lee', '1 Low Rd', '35680 Foça', 'TÜRKIYE']],
    [{ country: 'GT', city: 'Antigua' }, ['A. Lee', '1 Low Rd', 'Antigua', 'GUATEMALA']],
    [
      { country: 'GH', city: 'Accra', postcode: 'GA-184', region: 'Greater Accra' },
      ['A. Lee', '1 Low Rd', 'Accra GA-184', 'Greater Accra', 'GHANA'],
    ],
    [
      { country: 'AE', city: 'Dibba', region: 'Fujairah' },
      ['A. Lee', '1 Low Rd', 'Dibba', 'Fujairah', 'UNITED ARAB EMIRATES'],
    ],
    [
      { country: 'AX', city: 'Mariehamn', postcode: '22100' },
      ['A. Lee', '1 Low Rd', 'AX-22100 Mariehamn', 'ÅLAND', 'FINLAND'],
    ],
    [
      { country: 'JE', city: 'St Helier', postcode: 'JE2 3AB' },
      ['A. Lee', '1 Low Rd', 'St Helier', 'JERSEY', 'JE2 3AB', 'UNITED KINGDOM'],
    ],
  ])('%o', (given, lines) =>
    expect(
      formatAddress({ name: 'A. Lee', lines: ['1 Low Rd', ' '], ...given }, { script: 'own', from: 'NO' }),
    ).toEqual(lines),
  )

  test('no country line within the country, and none between a post and its islands', () => {
    const home: Address = { country: 'no', name: 'A', lines: ['B 1'], city: 'Bodø', postcode: '8001' }
    expect(formatAddress(home, { script: 'own', from: 'NO' })).toEqual(['A', 'B 1', '8001 Bodø'])
    expect(formatAddress({ ...home, country: 'JE' }, { script: 'own', from: 'GB' }).at(-1)).toBe('8001')
  })

  test('an address typed in Latin letters keeps the Latin order; a missing Latin city is not printed in another script', () => {
    const typed: Address = {
      country: 'JP',
      name: 'A. Lee',
      lines: ['1-2 Honmachi'],
      region: 'OSAKA',
      postcode: '541-0053',
    }
    expect(formatAddress(typed, { script: 'own', from: 'FR' })[0]).toBe('A. Lee')
    const half = { ...hana, latin: { name: 'Hana Mori', lines: ['1-2-3 Jingumae'], region: 'TOKYO' } }
    expect(formatAddress(half, { script: 'latin', from: 'FR' })).toEqual([
      'Hana Mori',
      '1-2-3 Jingumae, TOKYO',
      '150-0001',
      'JAPAN',
    ])
  })

  test('agrees with the reference package on complete addresses of every country it places in full', () => {
    for (const [country, format] of Object.entries(ADDRESS_FORMATS)) {
      const places = ['%C', '%Z', '%A', '%N', '%O'].every((part) => format.own.includes(part))
      if (!places || /%[DX]/.test(format.own)) continue
      const address = {
        country,
        name: 'N N',
        organization: 'Org',
        lines: ['L 1'],
        city: 'City',
        region: 'Reg',
        postcode: '12345',
      }
      const mine = formatAddress(address, { script: 'own', from: 'ZZ' }).slice(0, -1)
      const theirs = otherWay(
        {
          postalCountry: country,
          name: 'N N',
          organization: 'Org',
          addressLines: ['L 1'],
          locality: 'City',
          administrativeArea: 'Reg',
          postalCode: '12345',
        },
        format.latin === undefined ? 'local' : 'latin',
      )
      expect([country, ...mine]).toEqual([country, ...theirs.map((line) => line.trim())])
    }
  })

  test('never loses the name, a line, the city or the postcode, in any country', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('ZW', 'QA', ...Object.keys(ADDRESS_FORMATS)),
        fc.constantFrom('own', 'latin'),
        (country, script) => {
          const address = { country, name: 'Nnn', lines: ['Lll 1', 'Mmm 2'], city: 'Ccc', postcode: '99999' }
          const text = formatAddress(address, { script, from: 'AQ' }).join('\n')
          return ['Nnn', 'Lll 1', 'Mmm 2', 'Ccc', '99999'].every((part) => text.includes(part))
        },
      ),
    )
  })
})

describe('addressProblems', () => {
  const lee = { name: 'A. Lee', lines: ['1 Low Rd'] }

  // Needed parts: libaddressinput, as kept in required-fields.ts.
  test.each([
    ['US', ['city', 'region', 'postcode']],
    ['DE', ['city', 'postcode']],
    ['GB', ['city', 'postcode']],
    ['JP', ['region', 'postcode']],
    ['IE', ['city']],
  ])('%s needs %j', (country, fields) =>
    expect(errors({ country, ...lee }).map(({ field }) => field)).toEqual(fields),
  )

  test('forty destinations are kept', () => expect(Object.keys(REQUIRED_FIELDS)).toHaveLength(40))

  test('elsewhere the same gaps are questions', () => {
    expect(errors({ country: 'KE', name: 'A. Lee', lines: [] })).toEqual([])
    expect(addressProblems({ country: 'KE', name: 'A. Lee', lines: [] })).toContainEqual({
      field: 'city',
      problem: 'usually_given',
      severity: 'ask',
    })
  })

  test('nobody to hand it to, and no such country, are errors anywhere', () => {
    expect(errors({ country: 'KE', name: ' ', lines: ['x'] })).toEqual([
      { field: 'name', problem: 'missing', severity: 'error' },
    ])
    expect(errors({ country: 'QX', ...lee })).toEqual([
      { field: 'country', problem: 'not_a_country', severity: 'error' },
    ])
    expect(errors({ country: 'KE', name: '', organization: 'Org', lines: ['x'] })).toEqual([])
  })

  test.each([
    ['JP', '1500001'],
    ['JP', '１５０−０００１'],
    ['SE', '22100'],
    ['DE', 'D-89073'],
    ['GB', 'hu11aa'],
    ['NL', '1012ab'],
    ['PL', '00950'],
    ['CA', 'K1A0B1'],
    ['US', '97301-1234'],
    ['LV', 'LV-1010'],
  ])('%s takes the postcode %s without a question', (country, postcode) => {
    const found = addressProblems({ country, ...lee, city: 'X', region: 'Y', postcode })
    expect(found.filter(({ field }) => field === 'postcode')).toEqual([])
  })

  test('an odd postcode is a question, never an error', () =>
    expect(addressProblems({ country: 'DE', ...lee, city: 'Ulm', postcode: '8907' })).toEqual([
      { field: 'postcode', problem: 'unusual_form', severity: 'ask' },
    ]))

  test('a Japanese address in both scripts is fine, in one script it is asked about', () => {
    expect(addressProblems(hana)).toEqual([])
    expect(addressProblems({ ...hana, latin: undefined })).toEqual([
      { field: 'latin', problem: 'latin_missing', severity: 'ask' },
    ])
    expect(addressProblems({ ...hana, latin: { name: '森', lines: [] } }).map(({ field }) => field)).toEqual([
      'latin.lines',
      'latin.city',
      'latin.region',
      'latin.name',
    ])
  })

  test('customs of Brazil ask for a tax number', () =>
    expect(
      addressProblems({ country: 'BR', ...lee, city: 'Natal', region: 'RN', postcode: '59010-000' }),
    ).toEqual([{ field: 'taxNumber', problem: 'customs_asks', severity: 'ask' }]))

  test('a complete address is never refused, whatever is typed in it', () => {
    const word = fc.string({ minLength: 1 }).filter((text) => text.trim() !== '')
    fc.assert(
      fc.property(
        fc.constantFrom(...Object.keys(REQUIRED_FIELDS)),
        word,
        word,
        word,
        word,
        word,
        (country, name, line, city, region, postcode) =>
          errors({ country, name, lines: [line], city, region, postcode }).length === 0,
      ),
    )
  })
})
