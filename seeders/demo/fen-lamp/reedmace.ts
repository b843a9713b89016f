import type { ModulePlan } from '../acts/design-module'
import { CAUTIONS } from '../cautions'
import { shortPlan, threeOffers, usualParts, type Prices } from '../hollow-pier/shared'

export const REEDMACE_PRICES: Prices = {
  boards: { priceMinor: 4800, depositMinor: 1200 },
  kit: { priceMinor: 11_900, depositMinor: 3000 },
  built: { priceMinor: 21_900, depositMinor: 5000 },
}

/** Two resonators; dear to make, and honestly not wanted by enough people yet. */
export const REEDMACE: ModulePlan = {
  start: {
    name: 'Reedmace',
    slug: 'reedmace',
    oneLine: 'Pair of struck resonators',
    widthHp: 14,
    depthMm: 32,
  },
  page: {
    story: 'Two resonators that ring when struck and lean on each other. Tuned by hand, one unit at a time.',
    plus12Ma: 64,
    minus12Ma: 61,
    plus5Ma: 0,
    controls: [
      { kind: 'knob', label: 'Pitch', xMm: 18, yMm: 30, sizeMm: 18 },
      { kind: 'knob', label: 'Pitch', xMm: 52, yMm: 30, sizeMm: 18 },
      { kind: 'knob', label: 'Ring', xMm: 18, yMm: 60, sizeMm: 12 },
      { kind: 'knob', label: 'Ring', xMm: 52, yMm: 60, sizeMm: 12 },
      { kind: 'knob', label: 'Lean', xMm: 35, yMm: 46, sizeMm: 12 },
      { kind: 'jack', label: 'Strike', xMm: 18, yMm: 100, sizeMm: 6 },
      { kind: 'jack', label: 'Strike', xMm: 35, yMm: 100, sizeMm: 6 },
      { kind: 'jack', label: 'Out', xMm: 52, yMm: 100, sizeMm: 6 },
    ],
    specification: [{ name: 'Range', value: '40 Hz to 6 kHz, tracks for four octaves' }],
    cautions: CAUTIONS,
  },
  offers: threeOffers('GBP', 'GB', REEDMACE_PRICES),
  revisions: [{ letter: 'A', note: 'Third board, first lettered one.' }],
  firstUnit: 'Tuned and left ringing for a night.',
  parts: usualParts({ jacks: 6, pots: 9, chips: 7, controller: false }),
  rates: [
    { currency: 'USD', rate: '0.79' },
    { currency: 'EUR', rate: '0.86' },
  ],
  costs: shortPlan({
    ...{ onceMinutes: 1800, currency: 'GBP', labour: '2600', oneOff: '1850' },
    boards: '6: 6.80; 30: 4.90; 60: 3.70',
    fronts: '1: 24.00; 10: 16.00; 25: 12.50; 50: 10.40',
    assembly: '11.20',
  }),
}
