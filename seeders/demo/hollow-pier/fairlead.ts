import type { ModulePlan } from '../acts/design-module'
import { CAUTIONS } from '../cautions'
import { FAIRLEAD_PRICES } from './prices'
import { shortPlan, threeOffers, usualParts } from './shared'

const channel = (index: number) => {
  const xMm = 9 + index * 14
  return [
    { kind: 'slider', label: `Level ${index + 1}`, xMm, yMm: 46, sizeMm: 30 },
    { kind: 'button', label: `Mute ${index + 1}`, xMm, yMm: 72, sizeMm: 6 },
    { kind: 'light', label: '', xMm, yMm: 80, sizeMm: 3 },
    { kind: 'jack', label: `In ${index + 1}`, xMm, yMm: 94, sizeMm: 6 },
  ]
}

/** A mixer of four channels. */
export const FAIRLEAD: ModulePlan = {
  start: {
    name: 'Fairlead',
    slug: 'fairlead',
    oneLine: 'Four-channel mixer with mutes',
    widthHp: 12,
    depthMm: 30,
  },
  page: {
    story:
      'Four channels for sound or voltage, each with a mute that does not click, and a sum that bends before it breaks.',
    plus12Ma: 38,
    minus12Ma: 36,
    plus5Ma: 0,
    controls: [
      ...[0, 1, 2, 3].flatMap(channel),
      { kind: 'jack', label: 'Sum', xMm: 23, yMm: 112, sizeMm: 6 },
      { kind: 'jack', label: '−Sum', xMm: 37, yMm: 112, sizeMm: 6 },
    ],
    specification: [
      { name: 'Channels', value: '4, from 0 to twice the voltage' },
      { name: 'Noise', value: 'below 40 µV, 20 Hz to 20 kHz' },
    ],
    cautions: CAUTIONS,
  },
  offers: threeOffers('EUR', 'DE', FAIRLEAD_PRICES),
  revisions: [{ letter: 'A', note: 'Worked at once; kept.' }],
  firstUnit: 'Every step of the test plan; noise measured in a closed tin.',
  parts: usualParts({ jacks: 6, pots: 4, chips: 4, controller: false }),
  rates: [{ currency: 'USD', rate: '0.92' }],
  costs: shortPlan({
    ...{ onceMinutes: 420, currency: 'EUR', labour: '2300', oneOff: '290' },
    boards: '6: 4.30; 30: 2.70; 60: 2.05',
    fronts: '1: 15.00; 10: 11.00; 25: 9.10; 50: 7.80',
    assembly: '5.60',
  }),
}
