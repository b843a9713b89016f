import { z } from 'zod'
import { wholeNumber, type OfferKind } from './fields'
import { blank } from './rows'
import type { RunLine } from './run-page'

/** What happens if one step takes so many working days longer. */
export const SlipQuery = z.object({
  step: z.string().max(20).optional().catch(undefined),
  days: blank(wholeNumber(1, 200)).catch(undefined),
})
export type Slip = { step: string; days: number }

/** Days on which the workshop does not work, as typed: one a line, or from and to. */
export const ClosedDaysInput = z.object({ days: z.string().max(4000, 'This is too long.') })
export type ClosedDaysInput = z.infer<typeof ClosedDaysInput>

/** When an offer can be promised: chance of the promise there is, and the day kept in eight cases of ten. */
export type OfferDates = { offer: OfferKind; postedBy: string; chance: number; suggested: string }

export type ScheduleDesk = {
  run: { id: string; number: number; state: string }
  module: { slug: string; name: string }
  today: string
  start: string
  runLine: RunLine | null
  offers: OfferDates[]
  /** The same with one step slipped; null while nobody asked. */
  slipped: { name: string; days: number; offers: OfferDates[] } | null
  steps: {
    id: string
    name: string
    optimistic: number
    likely: number
    pessimistic: number
    after: string[]
    offers: OfferKind[]
    from: string
    to: string
    /** Working days a closure of whoever does it adds. */
    longer: number
    /** The chance that it decides the finish, by its bounds. */
    decides: { low: number; high: number }
  }[]
  /** False where more steps share others than can be worked out exactly: the dates are then the later bound. */
  isExact: boolean
  closedDays: string[]
}
