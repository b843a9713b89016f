import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { buyingList } from '@/lib/core/costs/buying-list'
import { callOffCost } from '@/lib/core/costs/call-off'
import { costCurve } from '@/lib/core/costs/curve'
import { emptyPlan, type CostPlan } from '@/lib/core/costs/plan'
import { cheapestPurchase } from '@/lib/core/costs/purchase'
import { costRun } from '@/lib/core/costs/run-cost'
import { divide } from '@/lib/core/money/allocate'
import { samplePlan } from './sample-plan'

/** Twenty built units with one of every cost; each expected line is worked out beside it. */
const byHand: CostPlan = {
  ...emptyPlan('EUR'),
  offers: [
    {
      offer: 'built',
      price: 10_000,
      deposit: 2000,
      isAssembled: true,
      minutesPerUnit: 10,
      minutesPerStart: 6,
      packaging: '12.25',
    },
  ],
  oneOff: [{ name: 'fixture', amount: 20_000, currency: 'EUR' }],
  boards: [
    {
      id: 'pcb',
      name: 'board',
      kind: 'board',
      perUnit: 1,
      neededFor: ['built'],
      perArray: 4,
      onHand: 0,
      attrition: { basisPoints: 0, atLeast: 0 },
      stencil: 300,
      quotes: [
        {
          supplier: 'fab',
          currency: 'USD',
          breaks: [{ from: 1, unitPrice: '1000' }],
          moq: 1,
          multiple: 1,
          setup: 500,
        },
      ],
    },
    {
      id: 'fp',
      name: 'front panel',
      kind: 'front_panel',
      perUnit: 1,
      neededFor: ['built'],
      perArray: 1,
      onHand: 0,
      attrition: { basisPoints: 0, atLeast: 0 },
      stencil: 0,
      quotes: [
        {
          supplier: 'cutter',
          currency: 'EUR',
          breaks: [{ from: 1, unitPrice: '250' }],
          moq: 1,
          multiple: 1,
          setup: 0,
        },
      ],
    },
  ],
  parts: [
    {
      id: 'R1',
      perUnit: 4,
      neededFor: ['built'],
      placedBy: { built: 'assembler' },
      onHand: 30,
      attrition: { basisPoints: 700, atLeast: 5 },
      joints: 2,
      byHand: false,
      quotes: [
        {
          supplier: 'shop',
          currency: 'EUR',
          breaks: [{ from: 1, unitPrice: '0.4' }],
          moq: 1,
          multiple: 1,
          setup: 0,
        },
      ],
    },
  ],
  assembly: {
    supplier: 'line',
    currency: 'EUR',
    setup: 1000,
    perDistinctPart: 150,
    perJoint: '0.5',
    perHandJoint: '3',
    perStart: '10.5',
  },
  suppliers: [
    {
      supplier: 'fab',
      currency: 'USD',
      freight: 1000,
      dutyBasisPoints: 1000,
      importTaxBasisPoints: 1900,
      isImportTaxReclaimable: false,
    },
  ],
  rates: [{ currency: 'USD', rate: '0.9', on: '2026-05-04', marginBasisPoints: 0 }],
  labour: { perHour: 3000, onceMinutes: 30 },
  yield: { basisPoints: 9000, confidenceBasisPoints: 9500 },
  orders: { unitsPerOrder: '1.5', paymentsPerOrder: 2, postageCharged: 600, postagePaid: 500 },
  fees: {
    home: { basisPoints: 150, fixed: 25 },
    foreignCard: { basisPoints: 175, shareBasisPoints: 4000 },
    conversion: { basisPoints: 0, shareBasisPoints: 0 },
    refund: { shareBasisPoints: 500, fixed: 30, isFeeLost: true },
    dispute: { shareBasisPoints: 100, fixed: 2000 },
  },
  tax: { mode: 'home_rate', pricesIncludeTax: true, rates: [{ basisPoints: 1900, weight: 1 }] },
}

describe('costRun', () => {
  const run = costRun(byHand, { built: 20 })

  test('every line of a small run, worked out by hand', () => {
    expect(run.starts).toBe(25) // 20 good with .90 and .95 takes 25 (R: need + qnbinom, check-values)
    expect(
      Object.fromEntries(run.lines.map(({ kind, name, amount }) => [`${kind} ${name}`, amount])),
    ).toEqual({
      'one_off fixture': 20_000,
      'board board': 6750, // 25 boards are 7 arrays of 4: (7 × 10.00 + 5.00) USD × 0.9
      'stencil board': 270, // 3.00 USD × 0.9
      'front_panel front panel': 5000, // 20, not 25: it goes on what passed
      'part R1': 31, // 25 × 4 = 100, 107 with 7 %, 77 without stock, × 0.4 = 30.8
      'assembly line': 1513, // 10.00 + 1.50 + 200 joints × 0.5 + 25 × 10.5 = 1512.5
      'freight fab': 900,
      'duty fab': 792, // 10 % of 6750 + 270 + 900
      'import_tax fab': 1655, // 19 % of 8712 = 1655.28
      'labour once': 1500,
      'labour built': 17_500, // 20 × 10 + 25 × 6 = 350 minutes at 30.00
      'packaging built': 245,
      'postage orders': 7000, // 20 ÷ 1.5 is 14 orders
      'payment_fee deposits': 950, // 1.5 % of 400.00 + 14 × 0.25
      'payment_fee balances': 2876, // 1.5 % of 1,684.00 + 14 × 0.25
      'payment_fee foreign cards': 1459, // 1.75 % of 40 % of 2,084.00 = 14.588
      'refund_fee orders paid back': 285, // 5 % of (950 + 2876 + 1459 + 14 × 30) = 285.25
      'dispute_fee disputed orders': 280, // 1 % of 14 × 20.00
    })
  })

  test('revenue is what buyers pay less the tax in it', () => {
    // 2,000.00 holds 319.33 at 19 %, postage of 14 × 6.00 = 84.00 holds 13.41.
    expect(run.revenue).toBe(200_000 - 31_933 + 8400 - 1341)
    expect(run.profit).toBe(run.revenue - run.cost)
    expect(run).toMatchObject({ orders: 14, paid: 208_400, deposits: 40_000 })
  })

  test('no registration, no tax; prices without tax leave the maker the whole price but cost fees on it', () => {
    expect(
      costRun({ ...byHand, tax: { ...byHand.tax, mode: 'not_registered' } }, { built: 20 }).revenue,
    ).toBe(208_400)
    const net = costRun({ ...byHand, tax: { ...byHand.tax, pricesIncludeTax: false } }, { built: 20 })
    expect(net.revenue).toBe(208_400)
    // 1.5 % of (2,084.00 × 1.19 − 400.00) = 31.1994, + 3.50
    expect(net.lines.find(({ name }) => name === 'balances')!.amount).toBe(3470)
  })

  test('one payment: one fee with one fixed sum per order', () => {
    const once = costRun({ ...byHand, orders: { ...byHand.orders, paymentsPerOrder: 1 } }, { built: 20 })
    const fees = once.lines.filter(
      ({ name }) => name === 'payments' || name === 'balances' || name === 'deposits',
    )
    expect(fees).toEqual([{ kind: 'payment_fee', name: 'payments', amount: 3126 + 350 }])
  })

  test('a margin on the rate makes purchases in that currency dearer, and only those', () => {
    const safe = costRun(
      { ...byHand, rates: [{ ...byHand.rates[0]!, marginBasisPoints: 200 }] },
      { built: 20 },
    )
    expect(safe.lines.find(({ kind }) => kind === 'board')!.amount).toBe(6885) // 75.00 × 0.918
    expect(safe.lines.find(({ kind }) => kind === 'front_panel')!.amount).toBe(5000)
  })

  test('what has no price is named and not summed', () => {
    const holes: CostPlan = {
      ...byHand,
      rates: [],
      parts: [{ ...byHand.parts[0]!, quotes: [] }],
      oneOff: [{ name: 'scope', amount: 5, currency: 'JPY' }],
    }
    expect(costRun(holes, { built: 20 }).unpriced).toEqual([
      { kind: 'one_off', name: 'scope', reason: 'no_rate' },
      { kind: 'board', name: 'board', reason: 'no_rate' },
      { kind: 'part', name: 'R1', reason: 'no_quote' },
    ])
    expect(
      costRun({ ...holes, parts: [{ ...holes.parts[0]!, onHand: 500 }] }, { built: 20 }).unpriced,
    ).toHaveLength(2)
    const foreignLine: CostPlan = {
      ...byHand,
      rates: [],
      boards: [],
      assembly: { ...byHand.assembly!, currency: 'USD' },
    }
    expect(costRun(foreignLine, { built: 20 }).unpriced).toEqual([
      { kind: 'assembly', name: 'line', reason: 'no_rate' },
    ])
  })

  test('nothing sold: what comes once is still paid, nothing else', () => {
    const none = costRun(byHand, {})
    expect(none).toMatchObject({ starts: 0, revenue: 0, cost: 21_500 })
    expect(none.lines.map(({ kind }) => kind)).toEqual(['one_off', 'labour'])
  })

  test('a part of one answer is bought for its share of the units', () => {
    const plan: CostPlan = {
      ...byHand,
      yield: { basisPoints: 10_000, confidenceBasisPoints: 9500 },
      choices: [
        {
          offer: 'built',
          answers: [
            { id: 'red', weight: 3, surcharge: 0 },
            { id: 'blue', weight: 1, surcharge: 700 },
          ],
        },
      ],
      parts: [{ ...byHand.parts[0]!, choice: 'blue', onHand: 0, attrition: { basisPoints: 0, atLeast: 0 } }],
      tax: { ...byHand.tax, mode: 'not_registered' },
    }
    expect(buyingList(plan, { built: 20 }).proposals.at(-1)).toMatchObject({
      id: 'R1',
      needed: 20,
      quantity: 20,
    })
    expect(costRun(plan, { built: 20 }).revenue).toBe(208_400 + 5 * 700)
  })

  test('a buyer’s parts are bought for units sold, not for units put into work', () => {
    const kit = { ...byHand, parts: [{ ...byHand.parts[0]!, placedBy: { built: 'buyer' as const } }] }
    expect(buyingList(kit, { built: 20 }).proposals.at(-1)).toMatchObject({ needed: 80 })
    expect(costRun(kit, { built: 20 }).lines.some(({ kind }) => kind === 'assembly')).toBe(false)
  })

  test('the cheapest quote counts duty and import tax that stays', () => {
    const quote = { currency: 'EUR', breaks: [{ from: 1, unitPrice: '100' }], moq: 1, multiple: 1, setup: 0 }
    const part = {
      ...byHand.parts[0]!,
      onHand: 0,
      quotes: [
        { ...quote, supplier: 'abroad' },
        { ...quote, supplier: 'near', breaks: [{ from: 1, unitPrice: '110' }] },
      ],
    }
    const abroad = {
      supplier: 'abroad',
      currency: 'EUR',
      freight: 0,
      dutyBasisPoints: 0,
      importTaxBasisPoints: 1900,
      isImportTaxReclaimable: false,
    }
    const takenFrom = (isImportTaxReclaimable: boolean) =>
      buyingList(
        { ...byHand, parts: [part], suppliers: [{ ...abroad, isImportTaxReclaimable }] },
        { built: 20 },
      ).proposals.at(-1)!.supplier
    expect([takenFrom(false), takenFrom(true)]).toEqual(['near', 'abroad'])
  })

  test.each<[string, () => unknown]>([
    ['quantities', () => costRun(byHand, { boards: 1 })],
    ['quantities', () => costRun(byHand, { built: -1 })],
    ['quantities', () => costRun(byHand, { built: 1.5 })],
    [
      'yield',
      () => costRun({ ...byHand, yield: { basisPoints: 0, confidenceBasisPoints: 9500 } }, { built: 1 }),
    ],
    [
      'yield',
      () => costRun({ ...byHand, yield: { basisPoints: 10_001, confidenceBasisPoints: 9500 } }, { built: 1 }),
    ],
    [
      'unitsPerOrder',
      () => costRun({ ...byHand, orders: { ...byHand.orders, unitsPerOrder: '0.5' } }, { built: 1 }),
    ],
    ['R1', () => costRun({ ...byHand, parts: [{ ...byHand.parts[0]!, onHand: -1 }] }, { built: 1 })],
    ['mix', () => costCurve(byHand, { built: 0 }, 3)],
    ['upTo', () => costCurve(byHand, { built: 1 }, -1)],
  ])('throws on wrong %s', (name, call) => {
    expect(call).toThrow(RangeError)
    expect(call).toThrow(name)
  })
})

describe('costRun, buyingList and costCurve on a large plan', () => {
  const plan = samplePlan(40)
  const quantities = fc.record({
    boards: fc.integer({ min: 0, max: 90 }),
    kit: fc.integer({ min: 0, max: 90 }),
    built: fc.integer({ min: 0, max: 90 }),
  })

  test('lines add up to the cost, to the last minor unit', () => {
    fc.assert(
      fc.property(quantities, (counts) => {
        const { lines, cost, revenue, profit } = costRun(plan, counts)
        return lines.reduce((sum, { amount }) => sum + amount, 0) === cost && revenue - cost === profit
      }),
      { numRuns: 40 },
    )
  })

  test('each proposal is the cheapest purchase of what is missing, and its lines are those of the cost', () => {
    const { proposals, unpriced } = buyingList(plan, { boards: 45, kit: 95, built: 165 })
    expect(unpriced).toEqual([])
    for (const proposal of proposals) {
      const item = [...plan.boards, ...plan.parts].find(({ id }) => id === proposal.id)!
      const quote = item.quotes.find(({ supplier }) => supplier === proposal.supplier)!
      const missing = Math.ceil((proposal.wanted - item.onHand) / ('perArray' in item ? item.perArray : 1))
      const cheapest = cheapestPurchase({ needed: missing, ...quote })
      expect(cheapest).toMatchObject({
        value: { quantity: proposal.quantity, cost: proposal.paid, leftover: proposal.leftover },
      })
    }
    const lines = costRun(plan, { boards: 45, kit: 95, built: 165 }).lines
    const bought = lines.filter(({ kind }) => ['part', 'board', 'front_panel'].includes(kind))
    expect(bought.map(({ amount }) => amount)).toEqual(proposals.map(({ amount }) => amount))
  })

  test('point n of the curve is costRun of n units split by divide', () => {
    const mix = { boards: 45, kit: 95, built: 165 }
    const curve = costCurve(plan, mix, 200)
    for (const n of [1, 2, 3, 7, 50, 99, 100, 101, 149, 200]) {
      const split = divide(n, Object.values(mix))
      const [boards, kit, built] = split.ok ? split.value : []
      const { revenue, cost, profit } = costRun(plan, { boards: boards!, kit: kit!, built: built! })
      expect(curve[n - 1]).toEqual({ revenue, cost, profit, unitCost: Math.floor((2 * cost + n) / (2 * n)) })
    }
  })
})

describe('callOffCost', () => {
  test('sums bound before the lock, and the fees of deposits taken and paid back', () => {
    const plan: CostPlan = { ...byHand, atRisk: [{ name: 'chips', amount: 1000, currency: 'USD' }] }
    // 200.00 + 9.00; 15 units are 10 orders with 300.00: 4.50 + 2.50 + 1.75 % of 40 % (2.10) + 10 × 0.30
    expect(callOffCost(plan, { built: 1 })(15)).toBe(20_000 + 900 + 450 + 250 + 210 + 300)
    expect(callOffCost(plan, { built: 1 })(0)).toBe(20_900)
  })
  test('fees the provider gives back are not lost', () => {
    const fair = {
      ...byHand,
      fees: { ...byHand.fees, refund: { shareBasisPoints: 0, fixed: 0, isFeeLost: false } },
    }
    expect(callOffCost(fair, { built: 1 })(15)).toBe(20_000)
  })
})

test('emptyPlan costs nothing, brings nothing and wants a currency', () => {
  expect(costRun(emptyPlan('JPY'), {})).toEqual({
    ...{ lines: [], unpriced: [], starts: 0, orders: 0 },
    ...{ paid: 0, deposits: 0, revenue: 0, cost: 0, profit: 0 },
  })
  expect(() => emptyPlan('XXX')).toThrow(RangeError)
})
