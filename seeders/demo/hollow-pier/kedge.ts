import type { ModulePlan } from '../acts/design-module'
import { CAUTIONS } from '../cautions'
import { KEDGE_PRICES } from './prices'
import { shortPlan, threeOffers, usualParts } from './shared'

const side = (label: string, xMm: number) => [
  { kind: 'knob', label: `Rise ${label}`, xMm, yMm: 28, sizeMm: 14 },
  { kind: 'knob', label: `Fall ${label}`, xMm, yMm: 52, sizeMm: 14 },
  { kind: 'switch', label: `Curve ${label}`, xMm, yMm: 72, sizeMm: 6 },
  { kind: 'jack', label: `In ${label}`, xMm, yMm: 90, sizeMm: 6 },
  { kind: 'jack', label: `Out ${label}`, xMm, yMm: 108, sizeMm: 6 },
]

/** Two slew limiters: the workshop's first module, with the lessons of its first boards. */
export const KEDGE: ModulePlan = {
  start: { name: 'Kedge', slug: 'kedge', oneLine: 'Dual slew limiter', widthHp: 8, depthMm: 25 },
  page: {
    story:
      'Two limits on how fast a voltage may rise and fall, each with its own curve. For glides, envelopes, slow weather.',
    plus12Ma: 22,
    minus12Ma: 21,
    plus5Ma: 0,
    controls: [...side('1', 11), ...side('2', 29)],
    specification: [
      { name: 'Range', value: '2 ms to 12 s for 10 V' },
      { name: 'Inputs', value: '100 kΩ, ±10 V' },
    ],
    cautions: CAUTIONS,
  },
  offers: threeOffers('EUR', 'DE', KEDGE_PRICES),
  revisions: [
    {
      letter: 'A',
      note: 'First boards, five built.',
      lessons: [
        {
          symptom: 'No light, and a warm regulator after plugging in.',
          howFound: 'Current limit of the bench supply.',
          cause: 'The silkscreen of the power header was reversed.',
          remedy: 'Silkscreen turned, the header is shrouded.',
          mendedIn: 'B',
        },
        {
          symptom: 'Output 2 does not reach its jack.',
          howFound: 'Buzzed it out from the amplifier on.',
          cause: 'The footprint of the jack was mirrored.',
          remedy: 'Footprint drawn from the measured part.',
          mendedIn: 'B',
        },
      ],
    },
    { letter: 'B', note: 'Both lessons mended; nothing else touched.' },
  ],
  firstUnit: 'Every step of the test plan; slopes measured at 1 ms, 1 s and 10 s.',
  parts: usualParts({ jacks: 4, pots: 4, chips: 2, controller: false }),
  rates: [{ currency: 'USD', rate: '0.92' }],
  costs: shortPlan({
    ...{ onceMinutes: 240, currency: 'EUR', labour: '2200', oneOff: '180' },
    boards: '6: 3.60; 30: 2.10; 60: 1.60',
    fronts: '1: 12.50; 10: 9.00; 25: 7.40; 50: 6.30',
    assembly: '4.80',
  }),
}
