import 'server-only'
import type { RunLine } from '@/lib/contracts/run-page'
import type { Day } from '@/lib/core/brand'
import { addWorkingDays, isWorkingDay } from '@/lib/core/promises/working-days'
import { finishDays, type FinishForecast, type ScheduleStep } from '@/lib/core/schedule/finish'
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

/** When the run's steps will be done; null without steps, or when they cannot be put in order. */
export function finishOf(facts: RunFacts): FinishForecast | null {
  const steps = facts.plan?.steps ?? []
  if (steps.length === 0) return null
  const finish = finishDays(steps)
  return finish.ok ? finish.value : null
}

/** The day by which everything is posted in eight cases of ten, counted in working days from the start. */
export function likelyBy(facts: RunFacts, finish: FinishForecast): Day {
  return addWorkingDays(startOf(facts), Math.ceil(later(finish.dayFor(SURE))), facts.closedDays)
}

/** The run's steps with their expected days, and the chance of keeping the earliest promise; null without steps. */
export function runLineOf(facts: RunFacts): RunLine | null {
  const finish = finishOf(facts)
  const postedBy = facts.offers.map(({ postedByOn }) => postedByOn).sort()[0]
  if (!facts.plan || !finish || !postedBy) return null
  const start = startOf(facts)
  const ends = new Map<string, number>()
  const endOf = (step: ScheduleStep): number => {
    const known = ends.get(step.id)
    if (known !== undefined) return known
    const begins = begin(step)
    const end = begins + pertMean(step.optimistic, step.likely, step.pessimistic)
    ends.set(step.id, end)
    return end
  }
  const steps = facts.plan.steps
  const begin = (step: ScheduleStep): number =>
    Math.max(0, ...steps.filter(({ id }) => step.after.includes(id)).map(endOf))
  const dayAfter = (days: number) => addWorkingDays(start, Math.max(0, Math.round(days)), facts.closedDays)
  const names = facts.plan.names
  return {
    steps: steps.map((step) => {
      const [from, to] = [dayAfter(begin(step)), dayAfter(endOf(step))]
      return { key: step.id, name: names[step.id] ?? step.id, from, to, state: stateOf(facts, from, to) }
    }),
    postedBy,
    chance: lesser(finish.chanceBy(workingDaysBetween(start, postedBy, facts.closedDays))),
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
