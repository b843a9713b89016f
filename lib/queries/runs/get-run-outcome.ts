import 'server-only'
import { QueryTypes } from 'sequelize'
import type { RunOutcome } from '@/lib/contracts/run-outcome'
import { costCurve } from '@/lib/core/costs/curve'
import { updateConversion } from '@/lib/core/demand/conversion'
import { can, type Actor } from '@/lib/core/policy/can'
import { daysBetween } from '@/lib/core/time/day'
import { sequelize } from '@/lib/db/sequelize'
import { Decision, Forecast, Outcome, Run, RunActuals, Waiver } from '@/models'
import { mixOf, planOfRun } from './costs-of'
import { decisionsOf, decidedUnitsOf } from './decisions-of'
import { conversionOf } from './forecast-of'
import { getRunFacts } from './get-run-facts'
import { CLASS_OF_OUTCOME } from './read-demand'
import type { RunFacts } from './run-facts'
import { unitsOf } from './units-of'

/**
 * A run against what was thought of it: forecasts kept on the way, each decision with its figures, dates, cost and yield, and
 * what the next run will believe; null when the actor may not see it. A fixed number of statements.
 */
export async function getRunOutcome(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  now: Date
}): Promise<RunOutcome | null> {
  const { actor, workshopId, runId, now } = cmd
  if (!can(actor, 'run:read', { workshopId })) return null
  const run = await Run.findOne({ where: { id: runId, workshopId }, include: ['module', 'workshop'] })
  const facts = run && (await getRunFacts({ workshopId, runId, now }))
  if (!run?.module || !run.workshop || !facts) return null
  const { module, workshop } = run
  const how = { where: { runId }, order: [['at', 'ASC']] as [string, string][] }
  const decisions = await Decision.findAll(how)
  const decidedUnits = decidedUnitsOf(decisions)
  const kept = await Forecast.findAll(how)
  const waivers = await Waiver.findAll(how)
  const actuals = await RunActuals.findOne({ where: { runId } })
  return {
    run: {
      ...{ id: run.id, number: run.number, state: run.state, currency: run.currency },
      ...{ minimum: run.minimum, maximum: run.maximum },
    },
    module: { slug: module.slug, name: module.name },
    workshop: { slug: workshop.slug, timeZone: workshop.timeZone, locale: workshop.locale },
    forecasts: kept.map(({ quarter, at, deposited, minimum, figures }) => ({
      ...{ quarter, at: at.toISOString(), deposited, minimum },
      ...figures,
      held: decidedUnits === null ? null : figures.low <= decidedUnits && decidedUnits <= figures.high,
    })),
    decidedUnits,
    decisions: decisionsOf(decisions),
    waivers: waivers.map(({ key, reason, at }) => ({ key, reason, at: at.toISOString() })),
    units: unitsBySort(facts),
    dates: await readDates(runId, workshop.timeZone),
    money: {
      ...plannedOf(facts),
      actual: actuals && {
        costMinor: actuals.costMinor,
        started: actuals.started,
        good: actuals.good,
      },
      ...(await readSums(runId)),
    },
    learned: await learnedOf(run.id, facts),
  }
}

function unitsBySort({ orders }: RunFacts): RunOutcome['units'] {
  const of = (...states: string[]) =>
    orders
      .filter(({ state, kind }) => kind === 'paid' && states.includes(state))
      .reduce((sum, { units }) => sum + units, 0)
  return {
    paid: of('paid', 'packed', 'posted'),
    lapsed: of('lapsed'),
    cancelled: of('cancelled'),
    withdrawn: of('withdrawn', 'returned'),
    open: of('reserved', 'balance_due'),
  }
}

/** Each offer's first promise, and the day its last order went out once all have. */
async function readDates(runId: string, zone: string): Promise<RunOutcome['dates']> {
  const rows = await sequelize.query<{ offer: string; promisedBy: string; postedOn: string | null }>(
    `select f.kind as offer, f.posted_by_first_on::text as "promisedBy",
            case when count(*) filter (where o.state in ('reserved', 'balance_due', 'paid', 'packed')) = 0
                 then (max(o.posted_at) at time zone $zone)::date::text end as "postedOn"
     from run_offers f left join order_lines l on l.run_offer_id = f.id left join orders o on o.id = l.order_id
     where f.run_id = $runId group by f.id order by f.kind`,
    { bind: { runId, zone }, type: QueryTypes.SELECT },
  )
  return rows.map((row) => ({
    ...row,
    daysLate: row.postedOn === null ? null : daysBetween(row.promisedBy, row.postedOn),
  }))
}

/** What the plan said of as many units as were paid. */
function plannedOf(facts: RunFacts) {
  const plan = planOfRun(facts)
  const { paid } = unitsBySort(facts)
  if (!plan || paid === 0) return { plannedCostMinor: null, plannedYield: null }
  const { mix } = mixOf(facts, unitsOf(facts))
  return {
    plannedCostMinor: costCurve(plan, mix, paid)[paid - 1]?.cost ?? null,
    plannedYield: plan.yield.basisPoints / 10_000,
  }
}

async function readSums(runId: string) {
  const [sums] = await sequelize.query<{ receivedMinor: number; refundedMinor: number }>(
    `select coalesce(sum(a.amount_minor), 0)::bigint as "receivedMinor",
            coalesce((select sum(f.amount_minor) from refunds f join orders p on p.id = f.order_id
                      where p.run_id = $runId and f.state = 'succeeded'), 0)::bigint as "refundedMinor"
     from payment_attempts a join orders o on o.id = a.order_id where o.run_id = $runId and a.state = 'captured'`,
    { bind: { runId }, type: QueryTypes.SELECT },
  )
  return sums ?? { receivedMinor: 0, refundedMinor: 0 }
}

/** What is believed of each class without this run, and with it. */
async function learnedOf(runId: string, facts: RunFacts): Promise<RunOutcome['learned']> {
  const rows = await Outcome.findAll({ where: { runId }, order: [['className', 'ASC']] })
  return rows.map(({ className, converted, notConverted }) => {
    const name = CLASS_OF_OUTCOME[className]
    const before = conversionOf(facts, name)
    const after = updateConversion(before, { converted, notConverted })
    return {
      name,
      seen: { converted, notConverted },
      before: before.alpha / (before.alpha + before.beta),
      after: after.alpha / (after.alpha + after.beta),
    }
  })
}
