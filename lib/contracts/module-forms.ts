import { z } from 'zod'
import { panelWidthMm, PANEL_HEIGHT_MM_3U } from '@/lib/core/rack/front-panel'
import { assignedCountry } from './workshops'
import {
  day,
  line,
  minorAmount,
  offerKind,
  optionalLine,
  paragraphs,
  slug,
  tick,
  uuid,
  wholeNumber,
} from './fields'
import { blank, rows } from './rows'

/** A length that may have one decimal place: 25.4, or 25,4 as some people write it. */
const millimetres = (most: number) => {
  const sentence = `Enter millimetres from 0 to ${most}, such as 25.4.`
  return z
    .union(
      [
        z.number(),
        z
          .string()
          .trim()
          .regex(/^\d{1,4}([.,]\d{1,2})?$/, sentence)
          .transform((typed) => Number(typed.replace(',', '.'))),
      ],
      { error: sentence },
    )
    .pipe(z.number({ error: sentence }).min(0, sentence).max(most, sentence))
}

const widthHp = wholeNumber(1, 200, 'Enter the width in whole HP, from 1 to 200.')
const depthMm = wholeNumber(1, 300, 'Enter the depth in whole millimetres, from 1 to 300.')
const milliamperes = wholeNumber(0, 5000, 'Enter whole milliamperes, from 0 to 5000.')
const name = line(80, 'Enter the name of the module.')
const oneLine = line(200, 'Say in one line what it is.')
/** A revision by its letter. */
export const revisionLetter = z
  .string({ error: 'Choose a revision by its letter.' })
  .trim()
  .toUpperCase()
  .regex(/^[A-Z]{1,2}$/, 'Choose a revision by its letter.')

/** The parts of an address that name a module. */
export const ModuleParams = z.object({ workshop: slug, module: slug })

export const ModuleNewInput = z.object({ name, slug, oneLine, widthHp, depthMm })
export type ModuleNewInput = z.infer<typeof ModuleNewInput>

export const CONTROL_KINDS = ['knob', 'jack', 'switch', 'button', 'light', 'slider', 'display'] as const

const Control = z.object({
  kind: z.enum(CONTROL_KINDS, { error: 'Choose what it is.' }),
  label: z.preprocess((typed) => typed ?? '', z.union([z.literal(''), line(40)])),
  xMm: millimetres(1100),
  yMm: millimetres(PANEL_HEIGHT_MM_3U),
  sizeMm: millimetres(200),
})

/** What a module's page says, and what its front-panel drawing is made from. */
export const ModuleFactsInput = z
  .object({
    name,
    oneLine,
    story: paragraphs(20_000),
    widthHp,
    depthMm,
    plus12Ma: milliamperes,
    minus12Ma: milliamperes,
    plus5Ma: milliamperes,
    controls: rows(Control, 120, ['kind']),
    specification: rows(z.object({ name: line(60, 'Name it.'), value: line(200, 'Enter its value.') }), 30),
    cautions: paragraphs(5000),
    videoUrl: blank(
      z.url({ protocol: /^https$/, error: 'Enter an address that begins with https.' }).max(500),
    ),
    hideInterestBelowTen: tick,
  })
  .superRefine(({ widthHp: hp, controls }, check) => {
    const widthMm = hp >= 1 && hp <= 200 ? panelWidthMm(hp) : Infinity
    controls.forEach(({ xMm }, i) => {
      if (xMm > widthMm)
        check.addIssue({
          code: 'custom',
          path: ['controls', i, 'xMm'],
          message: 'This lies beside the front panel.',
        })
    })
  })
export type ModuleFactsInput = z.infer<typeof ModuleFactsInput>

const size = blank(wholeNumber(1, 3000, 'Enter whole millimetres, from 1 to 3000.'))
const weight = blank(wholeNumber(1, 40_000, 'Enter whole grams, from 1 to 40000.'))

/** One form in which a module is sold. A price still open is left out; then a sign-up may be asked by a short list. */
export const OfferInput = z
  .object({
    offer: offerKind,
    currency: z.string().optional(),
    priceMinor: blank(minorAmount()),
    depositMinor: blank(minorAmount()),
    /** Prices to choose from while the price is open, as typed: "75, 85, 95". */
    priceList: optionalLine(200),
    taxClass: z.enum(['standard', 'reduced', 'zero'], { error: 'Choose a tax class.' }),
    contents: paragraphs(5000),
    netWeightG: weight,
    packedWeightG: weight,
    lengthMm: size,
    widthMm: size,
    heightMm: size,
    customsDescription: z.preprocess((typed) => typed ?? '', z.union([z.literal(''), line(200)])),
    customsCode: z.preprocess(
      (typed) => (typeof typed === 'string' ? typed.replaceAll(/[\s.]/g, '') : (typed ?? '')),
      z.string().regex(/^(\d{6,12})?$/, 'Enter six to twelve digits, or leave it empty.'),
    ),
    customsOrigin: blank(assignedCountry),
    storagePlace: z.preprocess((typed) => typed ?? '', z.union([z.literal(''), line(40)])),
    cautions: paragraphs(5000),
    ageFrom: wholeNumber(0, 99, 'Enter an age in years, from 0 to 99.'),
    withdrawn: tick,
  })
  .superRefine((offer, check) => {
    const at = (path: string, message: string) => check.addIssue({ code: 'custom', path: [path], message })
    const { priceMinor: price, depositMinor: deposit } = offer
    if (price === 0) at('priceMinor', 'Enter a price above zero, or leave it open.')
    if (deposit === 0) at('depositMinor', 'Enter a deposit above zero.')
    if (price !== undefined && deposit === undefined) at('depositMinor', 'Enter the deposit.')
    if (price === undefined && deposit !== undefined) at('priceMinor', 'Enter the price as well.')
    if (price !== undefined && deposit !== undefined && deposit > price)
      at('depositMinor', 'The deposit cannot be above the price.')
    if (
      offer.netWeightG !== undefined &&
      offer.packedWeightG !== undefined &&
      offer.netWeightG > offer.packedWeightG
    )
      at('packedWeightG', 'Packed it cannot weigh less than its contents.')
  })
export type OfferInput = z.infer<typeof OfferInput>

export const RevisionInput = z.object({
  letter: blank(revisionLetter),
  note: paragraphs(5000),
  boardWidthMm: size,
  boardHeightMm: size,
})
export type RevisionInput = z.infer<typeof RevisionInput>

export const LessonInput = z.object({
  revision: revisionLetter,
  symptom: paragraphs(2000, 3, 'Say what was seen.'),
  howFound: paragraphs(2000),
  cause: paragraphs(2000),
  remedy: paragraphs(2000),
})
export type LessonInput = z.infer<typeof LessonInput>
export const MendInput = z.object({ lesson: uuid, revision: revisionLetter })
export const WaiveInput = z.object({ lesson: uuid, reason: paragraphs(2000, 3, 'Say why you live with it.') })

/** A unit of a revision that passed everything: when, how it was established, and who saw it (the writer when left out). */
export const FirstUnitInput = z.object({
  revision: revisionLetter,
  on: day(),
  how: paragraphs(2000, 3, 'Say how you established that it works.'),
  by: blank(uuid),
})
export type FirstUnitInput = z.infer<typeof FirstUnitInput>

/** A parts list as CSV with headings; it replaces the revision's list. */
export const PartsInput = z.object({
  revision: revisionLetter,
  csv: z
    .string({ error: 'Paste the parts list.' })
    .min(1, 'Paste the parts list.')
    .max(300_000, 'This list is too long.'),
})
export type PartsInput = z.infer<typeof PartsInput>

export const SampleInput = z.object({
  part: uuid,
  fits: z.enum(['yes', 'no'], { error: 'Say whether it fits.' }),
  on: day(),
  note: optionalLine(1000),
})
export type SampleInput = z.infer<typeof SampleInput>
