import 'server-only'
import type { OfferDates, ScheduleDesk, Slip } from '@/lib/contracts/schedule'
import { can, type Actor } from '@/lib/core/policy/can'
import { Run } from '@/models'
import { getRunFacts } from './get-run-facts'
import { chanceOf, expectedDays, finishOf, likelyBy, planned, runLineOf, startOf } from './promise-of'
import type { RunFacts } from './run-facts'

/**
 * A run's steps with dates and chances, and what a slip would do to them; null when the actor may not see them, or there
 * is no such run. As many statements as the run's facts, and one.
 */
export async function getSchedule(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  slip: Slip | null
  now: Date
}): Promise<ScheduleDesk | null> {
  const { actor, workshopId, runId, slip, now } = cmd
  if (!can(actor, 'schedule:read', { workshopId })) return null
  const run = await Run.findOne({ where: { id: runId, workshopId }, include: ['module'] })
  const facts = run && (await getRunFacts({ workshopId, runId, now }))
  if (!run?.module || !facts) return null
  const finish = finishOf(facts)
  const days = expectedDays(facts)
  const names = facts.plan?.names ?? {}
  const late = slip && names[slip.step] !== undefined ? withSlip(facts, slip) : null
  const decides = (id: string) => {
    const share = finish?.criticalShare[id]
    if (share === undefined) return { low: 0, high: 0 }
    return typeof share === 'number' ? { low: share, high: share } : share
  }
  return {
    run: { id: run.id, number: run.number, state: run.state },
    module: { slug: run.module.slug, name: run.module.name },
    today: facts.today,
    start: startOf(facts),
    runLine: runLineOf(facts),
    offers: datesOf(facts),
    slipped: late && slip ? { name: names[slip.step] ?? '', days: slip.days, offers: datesOf(late) } : null,
    steps: planned(facts).map(({ step, longer }) => ({
      ...{ id: step.id, name: names[step.id] ?? step.id, longer },
      optimistic: step.optimistic - longer,
      likely: step.likely - longer,
      pessimistic: step.pessimistic - longer,
      after: step.after.map((id) => names[id] ?? id),
      offers: facts.offers
        .map(({ kind }) => kind)
        .filter((kind) => !step.offers || step.offers.length === 0 || step.offers.includes(kind)),
      ...(days.get(step.id) ?? { from: startOf(facts), to: startOf(facts) }),
      decides: decides(step.id),
    })),
    isExact: finish?.exact ?? true,
    closedDays: facts.closedDays,
  }
}

function datesOf(facts: RunFacts): OfferDates[] {
  return facts.offers.flatMap(({ kind, postedByOn }) => {
    const finish = finishOf(facts, kind)
    if (!finish) return []
    return [
      {
        offer: kind,
        postedBy: postedByOn,
        chance: chanceOf(facts, finish, postedByOn),
        suggested: likelyBy(facts, finish),
      },
    ]
  })
}

/** The facts as they would be if one step took longer, at best as at worst. */
function withSlip(facts: RunFacts, { step, days }: Slip): RunFacts {
  return {
    ...facts,
    plan: facts.plan && {
      ...facts.plan,
      steps: facts.plan.steps.map((each) =>
        each.id === step
          ? {
              ...each,
              optimistic: each.optimistic + days,
              likely: each.likely + days,
              pessimistic: each.pessimistic + days,
            }
          : each,
      ),
    },
  }
}
