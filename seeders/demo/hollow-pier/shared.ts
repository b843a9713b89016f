import type { PartLine } from '../acts/keep-parts'
import { CAUTIONS } from '../cautions'

/** Prices and deposits of the three forms, in cents as typed whole. */
export type Prices = Record<'boards' | 'kit' | 'built', { priceMinor: number; depositMinor: number }>

const FORMS = {
  boards: { contents: 'The assembled front panel and both bare boards.', net: 90, packed: 190 },
  kit: {
    contents: 'Boards with the small parts fitted, front panel, the rest in bags, the guide.',
    net: 260,
    packed: 380,
  },
  built: {
    contents: 'The module, built, tested and signed, a power cable, four screws.',
    net: 290,
    packed: 420,
  },
} as const

/** The three offers as typed, with what customs and scales want to know. */
export function threeOffers(currency: string, origin: string, prices: Prices): Record<string, unknown>[] {
  return (['boards', 'kit', 'built'] as const).map((offer) => ({
    offer,
    currency,
    ...prices[offer],
    taxClass: 'standard',
    contents: FORMS[offer].contents,
    netWeightG: FORMS[offer].net,
    packedWeightG: FORMS[offer].packed,
    lengthMm: 220,
    widthMm: 160,
    heightMm: 60,
    customsDescription: 'Electronic module for a music synthesizer',
    customsCode: '9207900000',
    customsOrigin: origin,
    storagePlace: { boards: 'Shelf 1', kit: 'Shelf 2', built: 'Shelf 3' }[offer],
    cautions: CAUTIONS,
    ageFrom: 14,
  }))
}

const fitted = { kit: 'assembler', built: 'assembler', stock: 40_000 } as const

/** What most modules of the workshop are made of; `jacks`, `pots` and `chips` as this one needs them. */
export function usualParts(given: {
  jacks: number
  pots: number
  chips: number
  controller: boolean
}): PartLine[] {
  const list = (letter: string, count: number) =>
    Array.from({ length: count }, (_, index) => `${letter}${index + 1}`).join(' ')
  const { jacks, pots, chips, controller } = given
  return [
    {
      ...{ code: 'R-0603-100K', description: 'Resistor 1 % 0603', value: '100k', designators: list('R', 36) },
      ...{ perUnit: 36, breaks: '100: 0.012; 1000: 0.006; 5000: 0.004', ...fitted },
    },
    {
      ...{
        code: 'C-0603-100N',
        description: 'Capacitor 50 V 0603',
        value: '100n',
        designators: list('C', 18),
      },
      ...{ perUnit: 18, breaks: '100: 0.021; 1000: 0.012; 4000: 0.009', ...fitted },
    },
    {
      ...{ code: 'OPA-QUAD', description: 'Operational amplifier, four', designators: list('U', chips) },
      ...{ perUnit: chips, supplyPins: 2, breaks: '1: 0.92; 50: 0.71; 200: 0.58', ...fitted },
    },
    ...(controller
      ? [
          {
            ...{ code: 'MCU-32', description: 'Microcontroller, 32 pins', designators: 'U20', perUnit: 1 },
            ...{ supplyPins: 3, breaks: '1: 3.40; 50: 2.85; 200: 2.40', ...fitted },
          },
        ]
      : []),
    {
      code: 'JACK-35-MONO',
      description: 'Jack socket 3.5 mm, mono, switched',
      designators: list('J', jacks),
      perUnit: jacks,
      kit: 'buyer',
      built: 'maker',
      sample: true,
      breaks: '100: 0.34; 500: 0.27; 2000: 0.23',
      stock: 12_000,
    },
    {
      code: 'POT-9MM-B100K',
      description: 'Potentiometer 9 mm, 100 kΩ linear, with knob',
      value: '100k lin',
      designators: list('RV', pots),
      perUnit: pots,
      kit: 'buyer',
      built: 'maker',
      sample: true,
      breaks: '50: 1.35; 200: 1.12; 1000: 0.95',
      stock: 3_400,
    },
    {
      code: 'HDR-2X5-SHROUD',
      description: 'Power header 2×5, shrouded',
      designators: 'J20',
      polarity: 'Red stripe at −12 V, towards the lower edge',
      perUnit: 1,
      kit: 'buyer',
      built: 'maker',
      breaks: '50: 0.28; 500: 0.19',
      stock: 8_000,
    },
  ]
}

type Costs = {
  onceMinutes: number
  currency: string
  labour: string
  boards: string
  fronts: string
  assembly: string
  oneOff: string
}

/** The short cost plan and the schedule as typed. */
export function shortPlan(given: Costs): Record<string, unknown> {
  const { currency } = given
  return {
    currency,
    offers: [
      { offer: 'boards', minutesPerUnit: 2, minutesPerStart: 0, packaging: '0.60' },
      { offer: 'kit', isAssembled: 'on', minutesPerUnit: 9, minutesPerStart: 3, packaging: '1.20' },
      { offer: 'built', isAssembled: 'on', minutesPerUnit: 34, minutesPerStart: 12, packaging: '1.50' },
    ],
    labourPerHourMinor: given.labour,
    onceMinutes: given.onceMinutes,
    yieldPercent: '94',
    confidencePercent: '95',
    unitsPerOrder: '1.2',
    postageChargedMinor: 1100,
    postagePaidMinor: 1050,
    fee: '1.5',
    feeFixedMinor: 25,
    foreignFee: '1.75',
    foreignShare: '35',
    refundShare: '4',
    disputeShare: '0.3',
    disputeFixedMinor: 2000,
    laterUnits: 12,
    failurePercent: '2',
    canLayOutMinor: 150000,
    taxes: [
      { rate: '19', weight: 3 },
      { rate: '0', weight: 2 },
    ],
    oneOff: [{ name: 'Prototypes and tools', amount: given.oneOff, currency }],
    atRisk: [],
    boards: [
      {
        ...{ name: 'Main board', kind: 'board', perUnit: 1, perArray: 6, spare: 2, moq: 6, multiple: 6 },
        ...{ boards: 'on', kit: 'on', built: 'on', supplier: 'Northmole Circuits', currency: 'USD' },
        ...{ setup: '38', stencil: '22', breaks: given.boards },
      },
      {
        ...{
          name: 'Front panel',
          kind: 'front_panel',
          perUnit: 1,
          perArray: 1,
          spare: 2,
          moq: 1,
          multiple: 1,
        },
        ...{ boards: 'on', kit: 'on', built: 'on', supplier: 'Plate & Print Altona', currency },
        ...{ setup: '35', stencil: '0', breaks: given.fronts },
      },
    ],
    assembly: {
      supplier: 'Northmole Circuits',
      currency: 'USD',
      setup: '140',
      perDistinctPart: '3',
      perStart: given.assembly,
    },
    suppliers: [
      {
        supplier: 'Northmole Circuits',
        currency: 'USD',
        freight: '65',
        duty: '0',
        importTax: '19',
        reclaimable: 'on',
      },
      { supplier: 'Plate & Print Altona', currency, freight: '9', duty: '0', importTax: '0' },
      { supplier: 'Brasswick Components', currency: 'EUR', freight: '12', duty: '0', importTax: '0' },
    ],
    steps: [
      { name: 'Boards made and fitted', optimistic: 12, likely: 18, pessimistic: 35, after: '' },
      { name: 'Front panels made', optimistic: 8, likely: 12, pessimistic: 25, after: '' },
      { name: 'Parts arrive', optimistic: 4, likely: 7, pessimistic: 30, after: '' },
      { name: 'Built and tested', optimistic: 8, likely: 14, pessimistic: 25, after: '1, 2, 3', built: 'on' },
      { name: 'Packed and posted', optimistic: 3, likely: 5, pessimistic: 10, after: '4' },
    ],
  }
}
