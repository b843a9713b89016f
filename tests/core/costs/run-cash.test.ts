import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { cashLow } from '@/lib/core/costs/cash'
import { emptyPlan, type CostPlan } from '@/lib/core/costs/plan'
import { runCash } from '@/lib/core/costs/run-cash'
import { costRun } from '@/lib/core/costs/run-cost'
import { samplePlan } from './sample-plan'

const days = {
  spentOn: '2026-04-01',
  lockOn: '2026-06-01',
  boughtOn: '2026-06-03',
  balancesOn: '2026-08-01',
  workedOn: '2026-08-10',
  postedOn: '2026-08-20',
}

describe('runCash', () => {
  test('a small run, by hand', () => {
    const plan: CostPlan = {
      ...emptyPlan('EUR'),
      offers: [
        {
          offer: 'kit',
          price: 10_000,
          deposit: 2000,
          isAssembled: false,
          minutesPerUnit: 0,
          minutesPerStart: 0,
          packaging: '100',
        },
      ],
      oneOff: [{ name: 'fixture', amount: 5000, currency: 'EUR' }],
      fees: { ...emptyPlan('EUR').fees, home: { basisPoints: 100, fixed: 0 } },
      payout: { delayDays: 7, reserveBasisPoints: 1000, reserveDays: 30 },
    }
    // 10 kits: 1,000.00 paid, 200.00 of it as deposits; 1 % fees; a tenth held for 30 days.
    expect(runCash(plan, { kit: 10 }, days)).toEqual([
      { day: '2026-06-08', amount: 17_820, what: 'deposits' },
      { day: '2026-07-08', amount: 1980, what: 'reserve' },
      { day: '2026-08-08', amount: 71_280, what: 'balances' },
      { day: '2026-09-07', amount: 7920, what: 'reserve' },
      { day: '2026-04-01', amount: -5000, what: 'one_off' },
      { day: '2026-08-10', amount: -1000, what: 'packaging' },
    ])
    expect(cashLow(runCash(plan, { kit: 10 }, days))).toMatchObject({ low: -5000, day: '2026-04-01' })
  })

  test('the movements add up to the profit', () => {
    const plan = samplePlan(12)
    const count = fc.integer({ min: 0, max: 60 })
    fc.assert(
      fc.property(
        count,
        count,
        count,
        fc.integer({ min: 0, max: 10_000 }),
        (boards, kit, built, reserveBasisPoints) => {
          const held = { ...plan, payout: { ...plan.payout, reserveBasisPoints } }
          const events = runCash(held, { boards, kit, built }, days)
          return (
            events.reduce((sum, { amount }) => sum + amount, 0) ===
            costRun(plan, { boards, kit, built }).profit
          )
        },
      ),
      { numRuns: 40 },
    )
  })

  test('throws on a day that is none', () =>
    expect(() => runCash(samplePlan(1), { kit: 1 }, { ...days, lockOn: '2026-02-30' })).toThrow(RangeError))
})
