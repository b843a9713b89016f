import 'server-only'
import type { RunLine } from '@/lib/contracts/run-page'
import type { Day } from '@/lib/core/brand'
import { addWorkingDays, isWorkingDay } from '@/lib/core/promises/working-days'
import { stepsFor, withClosures, type Lengthened, type PlannedStep } from '@/lib/core/schedule/closures'
import { finishDays, type FinishForecast } from '@/lib/core/schedule/finish'
import { pertMean } from '@/lib/core/schedule/pert'
import { addDays } from '@/lib/core/time/day'
import type { RunFacts } from './run-facts'

/** A promise is sound when it is kept in eight cases of ten (product.md, readiness line 7). */
const SURE = 0.8

/** The day the work begins: the lock, as it was or were it today; a draft cannot be locked before its decide-by day. */
export function startOf({ run, today }: RunFacts): Day {
  return run.lockedOn ?? (run.state === 'draft' ? run.decideByOn : today)
}

/** Bounds are read on the side that promises less. */
const later = (answer: number | { low: number; high: number }) =>
  typeof answer === 'number' ? answer : answer.high
const lesser = (answer: number | { low: number; high: number }) =>
  typeof answer === 'number' ? answer : answer.low

/** A run's steps, or those of one offer, with what closed suppliers add to them. */
export function planned(facts: RunFacts, offer?: string): Lengthened[] {
  const steps = facts.plan?.steps ?? []
  return withClosures(offer === undefined ? steps : stepsFor(steps, offer), startOf(facts), facts.closedDays)
}

/** When the run's steps, or those of one offer, will be done; null without steps, or when they cannot be put in order. */
export function finishOf(facts: RunFacts, offer?: string): FinishForecast | null {
  const steps = planned(facts, offer).map(({ step }) => step)
  if (steps.length === 0) return null
  const finish = finishDays(steps)
  return finish.ok ? finish.value : null
}

/** The day by which everything is posted in eight cases of ten, counted in working days from the start. */
export function likelyBy(facts: RunFacts, finish: FinishForecast): Day {
  return addWorkingDays(startOf(facts), Math.ceil(later(finish.dayFor(SURE))), facts.closedDays)
}

/** The chance of being done by a day. */
export function chanceOf(facts: RunFacts, finish: FinishForecast, by: Day): number {
  return lesser(finish.chanceBy(workingDaysBetween(startOf(facts), by, facts.closedDays)))
}

/** The days each step is expected to begin and end. */
export function expectedDays(facts: RunFacts): Map<string, { from: Day; to: Day }> {
  const steps = planned(facts).map(({ step }) => step)
  const ends = new Map<string, number>()
  const begin = (step: PlannedStep): number =>
    Math.max(0, ...steps.filter(({ id }) => step.after.includes(id)).map(endOf))
  const endOf = (step: PlannedStep): number => {
    const known = ends.get(step.id)
    if (known !== undefined) return known
    const end = begin(step) + pertMean(step.optimistic, step.likely, step.pessimistic)
    ends.set(step.id, end)
    return end
  }
  const dayAfter = (days: number) =>
    addWorkingDays(startOf(facts), Math.max(0, Math.round(days)), facts.closedDays)
  return new Map(steps.map((step) => [step.id, { from: dayAfter(begin(step)), to: dayAfter(endOf(step)) }]))
}

/** The run's steps with their expected days, and the chance of keeping the earliest promise; null without steps. */
export function runLineOf(facts: RunFacts): RunLine | null {
  const first = [...facts.offers].sort((a, b) => (a.postedByOn < b.postedByOn ? -1 : 1))[0]
  if (!facts.plan || !first || !finishOf(facts)) return null
  const finish = finishOf(facts, first.kind)
  const names = facts.plan.names
  return {
    steps: [...expectedDays(facts)].map(([key, { from, to }]) => ({
      ...{ key, name: names[key] ?? key, from, to },
      state: stateOf(facts, from, to),
    })),
    postedBy: first.postedByOn,
    chance: finish ? chanceOf(facts, finish, first.postedByOn) : 1,
  }
}

/** What the plan expects; what has really been done is told by the run's own progress. */
function stateOf({ run, today }: RunFacts, from: Day, to: Day): 'done' | 'now' | 'to_come' {
  if (run.state !== 'locked' || today < from) return 'to_come'
  return today > to ? 'done' : 'now'
}

function workingDaysBetween(from: Day, to: Day, closed: readonly Day[]): number {
  let days = 0
  for (let day = addDays(from, 1); day <= to; day = addDays(day, 1)) if (isWorkingDay(day, closed)) days += 1
  return days
}
