import type { ModulePlan } from '../acts/design-module'
import { CAUTIONS } from '../cautions'
import { ROWLOCK_PRICES } from './prices'
import { shortPlan, threeOffers, usualParts } from './shared'

const output = (index: number) => {
  const yMm = 34 + index * 20
  return [
    { kind: 'knob', label: `Swing ${index + 1}`, xMm: 26, yMm, sizeMm: 9 },
    { kind: 'jack', label: `÷ ${index + 1}`, xMm: 41, yMm, sizeMm: 6 },
  ]
}

/** A clock divider that lets each of its outputs lag. */
export const ROWLOCK: ModulePlan = {
  start: {
    name: 'Rowlock',
    slug: 'rowlock',
    oneLine: 'Clock divider with swing per output',
    widthHp: 10,
    depthMm: 27,
  },
  page: {
    story: [
      'Four divisions of one clock, and each of them may lag on its own: a little for a shuffle, a lot for a stumble.',
      'The lag follows the clock, so that it keeps its feel when you change the tempo. Nothing is hidden in a menu.',
    ].join('\n\n'),
    plus12Ma: 46,
    minus12Ma: 8,
    plus5Ma: 0,
    controls: [
      { kind: 'jack', label: 'Clock', xMm: 10, yMm: 34, sizeMm: 6 },
      { kind: 'jack', label: 'Reset', xMm: 10, yMm: 54, sizeMm: 6 },
      { kind: 'switch', label: 'Odd', xMm: 10, yMm: 76, sizeMm: 6 },
      { kind: 'light', label: 'Beat', xMm: 10, yMm: 96, sizeMm: 3 },
      ...[0, 1, 2, 3].flatMap(output),
    ],
    specification: [
      { name: 'Clock input', value: '1.5 V rising edge, up to 400 Hz' },
      { name: 'Swing', value: '0 to 66 % of a division' },
      { name: 'Outputs', value: '8 V gates, protected' },
    ],
    cautions: CAUTIONS,
  },
  offers: threeOffers('EUR', 'DE', ROWLOCK_PRICES),
  revisions: [
    {
      letter: 'A',
      note: 'Prototype, two built.',
      lessons: [
        {
          symptom: 'The third output misses a beat at fast clocks.',
          howFound: 'Scope on output 3 with a 300 Hz clock.',
          cause: 'The interrupt of the swing timer waited for the lamp.',
          remedy: 'The lamp is now written last.',
          mendedIn: 'B',
        },
      ],
    },
    { letter: 'B', note: 'Larger pads under the jacks; the reset jack moved by 2 mm.' },
  ],
  firstUnit: 'Every step of the test plan, and a week in the rehearsal room.',
  parts: usualParts({ jacks: 6, pots: 4, chips: 3, controller: true }),
  rates: [{ currency: 'USD', rate: '0.92' }],
  costs: shortPlan({
    ...{ onceMinutes: 900, currency: 'EUR', labour: '2400', oneOff: '640' },
    boards: '6: 4.10; 30: 2.60; 60: 1.95; 120: 1.60',
    fronts: '1: 14.00; 25: 8.60; 50: 7.20; 100: 6.10',
    assembly: '6.40',
  }),
}
