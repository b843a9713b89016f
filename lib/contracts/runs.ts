import { z } from 'zod'
import { day, line, minorAmount, offerKind, paragraphs, slug, uuid, wholeNumber } from './fields'

export const balanceWhen = z.enum(['at_lock', 'units_passed', 'before_packing'], {
  error: 'Choose when balances fall due.',
})

export const RunOfferInput = z.object({
  offer: offerKind,
  priceMinor: minorAmount(),
  depositMinor: minorAmount(),
  postedBy: day(),
})

/** A new run, as a draft. Cross-field mistakes are named at the field a person would mend. */
export const RunInput = z
  .object({
    module: slug,
    revision: z
      .string()
      .trim()
      .toUpperCase()
      .regex(/^[A-Z]{1,2}$/, 'Choose a revision by its letter.'),
    minimum: wholeNumber(1, 10_000),
    maximum: wholeNumber(1, 10_000),
    decideBy: day(),
    headStartHours: wholeNumber(0, 336).optional(),
    balanceWhen,
    /** How deposits are kept should decide-by lie beyond the provider's limit; shown to buyers. */
    holdingPlan: z.preprocess((typed) => (typed === '' ? undefined : typed), paragraphs(2000).optional()),
    offers: z
      .array(RunOfferInput, { error: 'Enter at least one offer.' })
      .min(1, 'Enter at least one offer.')
      .max(3),
  })
  .superRefine((run, check) => {
    const at = (path: (string | number)[], message: string) =>
      check.addIssue({ code: 'custom', path, message })
    if (run.minimum > run.maximum) at(['minimum'], 'The minimum cannot be above the maximum.')
    run.offers.forEach((offer, index) => {
      if (offer.priceMinor === 0) at(['offers', index, 'priceMinor'], 'Enter a price above zero.')
      if (offer.depositMinor === 0) at(['offers', index, 'depositMinor'], 'Enter a deposit above zero.')
      if (offer.depositMinor > offer.priceMinor)
        at(['offers', index, 'depositMinor'], 'The deposit cannot be above the price.')
      if (offer.postedBy <= run.decideBy)
        at(['offers', index, 'postedBy'], 'The posted-by date must be after the decide-by date.')
      if (run.offers.findIndex((other) => other.offer === offer.offer) !== index)
        at(['offers', index, 'offer'], 'Each offer can stand here once.')
    })
  })
export type RunInput = z.infer<typeof RunInput>

export const READINESS_KEYS = [
  'first_good_unit',
  'lessons',
  'quotes',
  'samples',
  'parts_list',
  'post_data',
  'promise',
  'page',
  'repay',
] as const
export type ReadinessKey = (typeof READINESS_KEYS)[number]
export type ReadinessState = 'ready' | 'missing' | 'unknown' | 'waived'

export const WaiverInput = z.object({ key: z.enum(READINESS_KEYS), reason: line(500, 'Give the reason.') })
export const LockInput = z.object({
  reason: z.preprocess((typed) => (typed === '' ? undefined : typed), paragraphs(1000).optional()),
  waivers: z.array(WaiverInput).max(9).optional(),
})
export type LockInput = z.infer<typeof LockInput>
export const CallOffInput = z.object({ reason: paragraphs(1000, 3, 'Say why; buyers will read it.') })
export type CallOffInput = z.infer<typeof CallOffInput>

export const LowerMinimumInput = z.object({ minimum: wholeNumber(1, 10_000) })
export const MoveDecideByInput = z.object({ decideBy: day() })

/** The words typed on a check-answers page; a program that calls the API sends none. */
export const Confirmed = z.object({ typed: z.string().max(200).optional() })

export const LockBody = LockInput.extend(Confirmed.shape)
export const CallOffBody = CallOffInput.extend(Confirmed.shape)

export const RunParams = z.object({ workshop: slug, run: uuid })
export const BulkParams = z.object({ workshop: slug, bulk: uuid })
export const RunsQuery = z.object({ after: uuid.optional() })

export type BulkAnswer = { bulk: string }
/** `done` and `failed` are apart; what is in neither still waits. */
export type BulkProgress = { total: number; done: number; failed: number }

/** `low` and `high` bound the 80 % range of units. */
export type ForecastFigures = { mean: number; low: number; high: number; chance: number }
export type RunFigures = {
  deposited: number
  held: number
  waiting: number
  forecast: ForecastFigures
  /** Least number of units at today's mix from which the run does not lose; null when there is none up to the maximum, or no cost plan. */
  breakEven: number | null
  expectedProfitMinor: number | null
  chanceOfLoss: number | null
  /** Assembled boards to put into work; null without a cost plan. */
  starts: number | null
}

/** What a decision weighs besides: money figures are null without a cost plan that knows the run's offers. */
export type RunWeighed = {
  /** Units under deposit expected to be paid in the end. */
  likelyToPay: number
  /** Profit in the worst of ten cases: nine of ten do better or as well. */
  worstInTenMinor: number | null
  /** What is left when a tenth of the units under deposit are not paid. */
  tenthFails: { units: number; profitMinor: number } | null
  /** The lowest the bank balance of the run gets, at so many units, and the first day it does. */
  cashLow: { units: number; lowMinor: number; on: string | null } | null
  /** What the forecast is made of: expected units of people on the list who are silent, and of newcomers. */
  fromListed: number
  fromNewcomers: number
  /** People invited who have not answered. */
  silent: number
}

export type RunView = {
  id: string
  module: { slug: string; name: string }
  revision: string
  state: 'draft' | 'taking_deposits' | 'locked' | 'called_off' | 'closed'
  currency: string
  minimum: number
  maximum: number
  decideBy: string
  balanceWhen: z.infer<typeof balanceWhen>
  opensToAllAt: string | null
  offers: { offer: 'boards' | 'kit' | 'built'; priceMinor: number; depositMinor: number; postedBy: string }[]
  figures: RunFigures
  readiness: { key: ReadinessKey; state: ReadinessState; words: string }[]
}

export type RunListItem = Pick<
  RunView,
  'id' | 'module' | 'revision' | 'state' | 'minimum' | 'maximum' | 'decideBy'
> & {
  /** Counts up from 1 within the module. */
  number: number
  deposited: number
}
