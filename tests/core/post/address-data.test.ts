import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'
import { ADDRESS_COUNTRIES } from '@/lib/core/data/address-countries'
import { addressFiles } from '@/scripts/data/address'

test.each(Object.entries(addressFiles()))(
  '%s is what scripts/data/address.ts makes of its package',
  (name, text) =>
    expect(readFileSync(new URL(`../../../lib/core/data/${name}`, import.meta.url), 'utf8')).toBe(text),
)

test('249 assigned alpha-2 codes (ISO 3166-1), and XK beside them', () =>
  expect(Object.keys(ADDRESS_COUNTRIES).filter((code) => code !== 'XK')).toHaveLength(249))
