import 'server-only'
import { QueryTypes } from 'sequelize'
import type { DemandBoard } from '@/lib/contracts/demand'
import { OLD_AFTER_DAYS } from '@/lib/core/demand/conversion'
import { can, type Actor } from '@/lib/core/policy/can'
import { daysBetween } from '@/lib/core/time/day'
import { sequelize } from '@/lib/db/sequelize'
import { figuresOf, TAIL } from '@/lib/queries/runs/figures-of'
import { forecastOfRun, isExpecting } from '@/lib/queries/runs/forecast-of'
import { getRunFacts } from '@/lib/queries/runs/get-run-facts'
import type { RunFacts } from '@/lib/queries/runs/run-facts'
import { unitsOf } from '@/lib/queries/runs/units-of'
import { Run } from '@/models'
import { beliefsOf, neededOf } from './beliefs-of'
import { interestOf } from './interest-of'
import { pricePointsOf, type PricedSignUp } from './price-points-of'
import { readInterest } from './read-interest'

/**
 * What a run may expect and where that comes from; null when the actor may not see it. A fixed number of statements; people
 * are counted, never named.
 */
export async function getDemandBoard(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  now: Date
}): Promise<DemandBoard | null> {
  const { actor, workshopId, runId, now } = cmd
  if (!can(actor, 'demand:read', { workshopId })) return null
  const row = await Run.findOne({ where: { id: runId, workshopId }, include: ['module', 'workshop'] })
  const facts = row && (await getRunFacts({ workshopId, runId, now }))
  if (!row?.module || !row.workshop || !facts) return null
  const { module, workshop } = row
  const units = unitsOf(facts)
  const forecast = forecastOfRun(facts, units.deposited)
  const { figures } = figuresOf(facts)
  const expecting = isExpecting(facts)
  return {
    module: { slug: module.slug, name: module.name },
    currency: row.currency,
    locale: workshop.locale,
    ...interestOf(await readInterest(row.moduleId, workshop.timeZone)),
    run: {
      id: row.id,
      number: row.number,
      state: row.state,
      minimum: row.minimum,
      maximum: row.maximum,
      decideBy: row.decideByOn,
    },
    isExpecting: expecting,
    daysLeft: Math.max(0, daysBetween(facts.today, row.decideByOn)),
    deposited: units.deposited,
    total: figures.forecast,
    byForecast: facts.offers.map(({ kind }) => {
      const deposited = units.depositedByOffer[kind] ?? 0
      const own = forecastOfRun(facts, deposited, kind).forecast
      return { offer: kind, deposited, mean: own.mean, low: own.quantile(TAIL), high: own.quantile(1 - TAIL) }
    }),
    fromListed: forecast.fromListed,
    fromNewcomers: forecast.fromNewcomers,
    newcomers: {
      seen: facts.newcomers.here.reduce((sum, { people }) => sum + people, 0),
      days: Math.floor(facts.newcomers.daysHere),
    },
    arrivedBy: forecast.curve.shareBy(facts.window.gone),
    learnedFrom: facts.arrivalsSeen.length,
    beliefs: beliefsOf(facts, forecast),
    needed: expecting ? neededOf(facts, forecast, units.deposited) : [],
    invitations: await countInvitations(runId),
    byChoice: await countChoices(runId),
    prices: pricePointsOf(facts, await readPriced(facts, now)),
  }
}

async function countInvitations(runId: string): Promise<DemandBoard['invitations']> {
  const rows = await sequelize.query<{ state: keyof DemandBoard['invitations']; count: number }>(
    'select state, count(*)::int as count from invitations where run_id = $runId group by 1',
    { bind: { runId }, type: QueryTypes.SELECT },
  )
  const of = (state: string) => rows.find((row) => row.state === state)?.count ?? 0
  const all = rows.reduce((sum, { count }) => sum + count, 0)
  return { sent: all, ordered: of('ordered'), declined: of('declined'), expired: of('expired') }
}

/** What those under deposit chose. */
function countChoices(runId: string): Promise<DemandBoard['byChoice']> {
  return sequelize.query<DemandBoard['byChoice'][number]>(
    `select c->>'question' as question, c->>'label' as answer, sum(l.quantity)::int as units
     from orders o join order_lines l on l.order_id = o.id cross join lateral jsonb_array_elements(l.choices) c
     where o.run_id = $runId and o.kind = 'paid'
       and o.state in ('reserved', 'balance_due', 'paid', 'packed', 'posted')
     group by 1, 2 order by 1, 3 desc, 2`,
    { bind: { runId }, type: QueryTypes.SELECT },
  )
}

/** Prices are asked about only while they are open. */
async function readPriced({ run }: RunFacts, now: Date): Promise<PricedSignUp[]> {
  if (run.state !== 'draft') return []
  return sequelize.query<PricedSignUp>(
    `select f.kind as offer, s.quantity, s.top_price_minor as "topPrice",
            case when s.confirmed_at < $now::timestamptz - make_interval(days => $oldAfter) then 'oldSignUp'
                 else s.certainty end as certainty
     from signups s join offers f on f.id = s.offer_id
     where s.module_id = $moduleId and s.state = 'confirmed'`,
    {
      bind: { moduleId: run.moduleId, now: now.toISOString(), oldAfter: OLD_AFTER_DAYS },
      type: QueryTypes.SELECT,
    },
  )
}
