import type { Day } from '@/lib/core/brand'
import { addWorkingDays, isWorkingDay } from '@/lib/core/promises/working-days'
import type { ScheduleStep } from '@/lib/core/schedule/finish'
import { pertMean } from '@/lib/core/schedule/pert'
import { addDays } from '@/lib/core/time/day'

/** A step as somebody plans it: who it is for, and when whoever does it is closed. */
export type PlannedStep = ScheduleStep & {
  /** Offers that need it; left out or empty: all of them. */
  readonly offers?: readonly string[]
  /** First and last day on which nobody works on it; null or left out: none. */
  readonly closedFrom?: Day | null
  readonly closedTo?: Day | null
}

/** A step whose estimates a closure has made longer, and by how many working days. */
export type Lengthened = { readonly step: PlannedStep; readonly longer: number }

/**
 * The steps one offer waits for. A step that is not for it is left out, and whoever waited for it waits for what that step
 * waited for.
 * Domain:   steps that do not wait for one another in a circle (`finishDays` refuses those).
 * @example  stepsFor([{ id: 'a', optimistic: 1, likely: 1, pessimistic: 1, after: [], offers: ['built'] }], 'kit')  // → []
 */
export function stepsFor(steps: readonly PlannedStep[], offer: string): PlannedStep[] {
  const byId = new Map(steps.map((step) => [step.id, step]))
  const isFor = ({ offers }: PlannedStep) => !offers || offers.length === 0 || offers.includes(offer)
  const waitsFor = (step: PlannedStep, seen: ReadonlySet<string>): string[] =>
    step.after.flatMap((id) => {
      const before = byId.get(id)
      if (!before || isFor(before)) return [id]
      return seen.has(id) ? [] : waitsFor(before, new Set([...seen, id]))
    })
  return steps
    .filter(isFor)
    .map((step) => ({ ...step, after: [...new Set(waitsFor(step, new Set([step.id])))] }))
}

/**
 * Makes steps longer by the working days on which whoever does them is closed while they are expected to be under way.
 * Units:    days 'YYYY-MM-DD'; estimates in working days from `start`.
 * Domain:   as `finishDays`; steps in a circle are given back as they are.
 * Note:     where a step stands is taken from the expected lengths of those before it, so that a closure counts in full or
 *           not at all; all three estimates grow by the same days.
 * @example  withClosures([{ id: 'a', optimistic: 2, likely: 2, pessimistic: 2, after: [], closedFrom: '2027-03-02', closedTo: '2027-03-02' }], '2027-03-01', [])[0].longer  // → 1
 */
export function withClosures(
  steps: readonly PlannedStep[],
  start: Day,
  holidays: readonly Day[],
): Lengthened[] {
  const byId = new Map(steps.map((step) => [step.id, step]))
  const ends = new Map<string, number>()
  const longer = new Map<string, number>()
  const endOf = (step: PlannedStep, waiting: ReadonlySet<string>): number => {
    const known = ends.get(step.id)
    if (known !== undefined) return known
    const begins = Math.max(
      0,
      ...step.after.map((id) => {
        const before = byId.get(id)
        return before && !waiting.has(id) ? endOf(before, new Set([...waiting, id])) : 0
      }),
    )
    const length = pertMean(step.optimistic, step.likely, step.pessimistic)
    const lost = closedWithin(step, start, begins, length, holidays)
    ends.set(step.id, begins + length + lost)
    longer.set(step.id, lost)
    return begins + length + lost
  }
  for (const step of steps) endOf(step, new Set([step.id]))
  return steps.map((step) => {
    const lost = longer.get(step.id) ?? 0
    const { optimistic, likely, pessimistic } = step
    const later = { optimistic: optimistic + lost, likely: likely + lost, pessimistic: pessimistic + lost }
    return { step: { ...step, ...later }, longer: lost }
  })
}

/** Working days of a step's closure between its beginning and its end, which moves back by them. */
function closedWithin(
  { closedFrom, closedTo }: PlannedStep,
  start: Day,
  begins: number,
  length: number,
  holidays: readonly Day[],
): number {
  if (!closedFrom || !closedTo) return 0
  const first = addWorkingDays(start, Math.round(begins), holidays)
  for (let lost = 0; ;) {
    const last = addWorkingDays(start, Math.round(begins + length) + lost, holidays)
    let closed = 0
    for (let day = closedFrom; day <= closedTo && day <= last; day = addDays(day, 1))
      if (day > first && isWorkingDay(day, holidays)) closed += 1
    if (closed === lost) return lost
    lost = closed
  }
}
