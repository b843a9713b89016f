import { emptyPlan, type CostPlan } from '@/lib/core/costs/plan'
import type { PlanPart } from '@/lib/core/costs/plan-buying'

/** A part quoted by two suppliers in two currencies, with breaks that bite. Numbers invented. */
export function samplePart(i: number): PlanPart {
  return {
    id: `part-${i}`,
    perUnit: 1 + (i % 4),
    neededFor: i % 5 === 0 ? ['built'] : ['kit', 'built'],
    placedBy: { built: i % 3 === 0 ? 'maker' : 'assembler', kit: 'buyer' },
    choice: undefined,
    onHand: i % 7 === 0 ? 25 : 0,
    attrition: { basisPoints: i % 2 === 0 ? 200 : 0, atLeast: i % 2 === 0 ? 10 : 0 },
    joints: 2 + (i % 14),
    byHand: i % 6 === 0,
    quotes: [
      {
        supplier: 'Distributor East',
        currency: 'USD',
        breaks: [
          { from: 1, unitPrice: `${12 + (i % 30)}.5` },
          { from: 100, unitPrice: `${8 + (i % 30)}.25` },
          { from: 1000, unitPrice: `${5 + (i % 30)}.125` },
        ],
        moq: i % 9 === 0 ? 50 : 1,
        multiple: i % 4 === 0 ? 10 : 1,
        setup: 0,
      },
      {
        supplier: 'Counter West',
        currency: 'EUR',
        breaks: [
          { from: 1, unitPrice: `${13 + (i % 30)}` },
          { from: 250, unitPrice: `${7 + (i % 30)}.6` },
        ],
        moq: 1,
        multiple: 1,
        setup: i % 11 === 0 ? 350 : 0,
      },
    ],
  }
}

/** A plan that uses every kind of cost there is. Numbers invented. */
export function samplePlan(parts: number): CostPlan {
  return {
    ...emptyPlan('EUR'),
    offers: [
      {
        offer: 'boards',
        price: 4500,
        deposit: 1000,
        isAssembled: false,
        minutesPerUnit: 6,
        minutesPerStart: 0,
        packaging: '45.5',
      },
      {
        offer: 'kit',
        price: 9500,
        deposit: 2000,
        isAssembled: false,
        minutesPerUnit: 25,
        minutesPerStart: 0,
        packaging: '80',
      },
      {
        offer: 'built',
        price: 18900,
        deposit: 2500,
        isAssembled: true,
        minutesPerUnit: 8,
        minutesPerStart: 22,
        packaging: '95',
      },
    ],
    choices: [
      {
        offer: 'built',
        answers: [
          { id: 'black', weight: 3, surcharge: 0 },
          { id: 'bare', weight: 1, surcharge: 500 },
        ],
      },
    ],
    oneOff: [
      { name: 'first units', amount: 24000, currency: 'EUR' },
      { name: 'test fixture', amount: 6000, currency: 'USD' },
    ],
    perUnit: [{ name: 'repairs set aside', offer: 'built', amount: '125.5' }],
    boards: [
      {
        id: 'main',
        name: 'main board',
        kind: 'board',
        perUnit: 1,
        neededFor: ['boards', 'kit', 'built'],
        perArray: 4,
        onHand: 0,
        attrition: { basisPoints: 200, atLeast: 2 },
        stencil: 1800,
        quotes: [
          {
            supplier: 'Fab South',
            currency: 'USD',
            breaks: [
              { from: 5, unitPrice: '900' },
              { from: 30, unitPrice: '520' },
              { from: 100, unitPrice: '410' },
            ],
            moq: 5,
            multiple: 5,
            setup: 4000,
          },
        ],
      },
      ...(['black', 'bare'] as const).map((finish) => ({
        id: finish,
        name: `${finish} front panel`,
        kind: 'front_panel' as const,
        perUnit: 1,
        neededFor: ['built'],
        choice: finish,
        perArray: 1,
        onHand: 0,
        attrition: { basisPoints: 0, atLeast: 1 },
        stencil: 0,
        quotes: [
          {
            supplier: 'Fab South',
            currency: 'USD',
            breaks: [
              { from: 1, unitPrice: '980' },
              { from: 50, unitPrice: '640' },
            ],
            moq: 10,
            multiple: 1,
            setup: 2500,
          },
        ],
      })),
    ],
    parts: Array.from({ length: parts }, (_, i) => samplePart(i)),
    assembly: {
      supplier: 'Line North',
      currency: 'USD',
      setup: 15000,
      perDistinctPart: 150,
      perJoint: '1.25',
      perHandJoint: '6.5',
      perStart: '40',
    },
    suppliers: [
      {
        supplier: 'Distributor East',
        currency: 'USD',
        freight: 2500,
        dutyBasisPoints: 270,
        importTaxBasisPoints: 1900,
        isImportTaxReclaimable: false,
      },
      {
        supplier: 'Fab South',
        currency: 'USD',
        freight: 4200,
        dutyBasisPoints: 0,
        importTaxBasisPoints: 1900,
        isImportTaxReclaimable: true,
      },
    ],
    rates: [{ currency: 'USD', rate: '0.9234', on: '2026-05-04', marginBasisPoints: 250 }],
    labour: { perHour: 2400, onceMinutes: 600 },
    yield: { basisPoints: 9500, confidenceBasisPoints: 9500 },
    orders: { unitsPerOrder: '1.15', paymentsPerOrder: 2, postageCharged: 950, postagePaid: 1010 },
    fees: {
      home: { basisPoints: 150, fixed: 25 },
      foreignCard: { basisPoints: 175, shareBasisPoints: 4000 },
      conversion: { basisPoints: 200, shareBasisPoints: 2500 },
      refund: { shareBasisPoints: 400, fixed: 0, isFeeLost: true },
      dispute: { shareBasisPoints: 30, fixed: 2000 },
    },
    tax: {
      mode: 'destination_rate',
      pricesIncludeTax: true,
      rates: [
        { basisPoints: 1900, weight: 5 },
        { basisPoints: 2550, weight: 1 },
        { basisPoints: 0, weight: 4 },
      ],
    },
    payout: { delayDays: 7, reserveBasisPoints: 0, reserveDays: 0 },
    atRisk: [{ name: 'last-buy chips', amount: 18000, currency: 'USD' }],
  }
}
