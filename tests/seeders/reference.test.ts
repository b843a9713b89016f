import { expect, test } from 'vitest'
import { seedReference } from '@/seeders/reference'
import { EU_MEMBERS } from '@/lib/core/data/eu-members'
import { TaxRate } from '@/models'

test('every environment knows the standard rates of the Union and its neighbours, written once', async () => {
  const before = await TaxRate.findAll({ where: { workshopId: null } })
  // 27 member states, GB, NO and CH; spot checks from check-values.md.
  expect(before).toHaveLength(30)
  const rate = Object.fromEntries(before.map(({ country, basisPoints }) => [country, basisPoints]))
  expect(rate).toMatchObject({ DE: 1900, FI: 2550, HU: 2700, LU: 1700, GB: 2000, CH: 810 })
  expect(EU_MEMBERS.filter((country) => rate[country] === undefined)).toEqual([])
  await TaxRate.update({ basisPoints: 1950 }, { where: { country: 'DE', workshopId: null } })
  await seedReference()
  expect(await TaxRate.count({ where: { workshopId: null } })).toBe(30)
  const [german] = await TaxRate.findAll({ where: { country: 'DE', workshopId: null } })
  expect(german?.basisPoints).toBe(1950)
})
