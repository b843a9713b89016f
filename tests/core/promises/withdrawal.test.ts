import { describe, expect, test } from 'vitest'
import { hasWithdrawalRight, withdrawalEnds } from '@/lib/core/promises/withdrawal'

describe('withdrawalEnds', () => {
  // Directive 2011/83/EU Art. 9 with Regulation 1182/71 Art. 3, counted on a calendar:
  // Monday 2 March 2026 and 14 days is Monday 16 March; Saturday 7 March and 14 is Saturday 21, so Monday 23.
  test.each([
    ['DE', '2026-03-02', [], '2026-03-16'],
    ['DE', '2026-03-07', [], '2026-03-23'],
    ['FR', '2026-03-08', [], '2026-03-23'],
    ['DE', '2026-03-20', ['2026-04-03', '2026-04-06'], '2026-04-07'],
    ['AT', '2025-12-11', ['2025-12-25', '2025-12-26'], '2025-12-29'],
    ['GB', '2026-03-02', [], '2026-03-16'],
    ['NO', '2026-03-02', [], '2026-03-16'],
    ['RE', '2026-03-02', [], '2026-03-16'],
  ])('%s, delivered %s, off %j: %s', (country, lastDeliveredOn, holidays, end) => {
    expect(withdrawalEnds({ country, lastDeliveredOn, holidays })).toBe(end)
  })

  test.each(['US', 'JP', 'CH'])('%s has no such right: ask first', (country) => {
    expect(hasWithdrawalRight(country)).toBe(false)
    expect(() => withdrawalEnds({ country, lastDeliveredOn: '2026-03-02', holidays: [] })).toThrow(/country/)
  })

  test.each([
    ['XX', '2026-03-02', []],
    ['DE', '2026-02-30', []],
    ['DE', '2026-03-02', ['Easter']],
  ])('throws for %s %s %j', (country, lastDeliveredOn, holidays) => {
    expect(() => withdrawalEnds({ country, lastDeliveredOn, holidays })).toThrow(RangeError)
  })
})
