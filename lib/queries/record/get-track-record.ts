import 'server-only'
import { QueryTypes } from 'sequelize'
import type { TrackRecord } from '@/lib/contracts/track-record'
import { brierScore, calibration } from '@/lib/core/demand/score'
import { can, type Actor } from '@/lib/core/policy/can'
import { wilson } from '@/lib/core/quality/interval'
import { daysBetween } from '@/lib/core/time/day'
import { sequelize } from '@/lib/db/sequelize'
import { CLASS_OF_OUTCOME } from '@/lib/queries/runs/read-demand'
import { Workshop } from '@/models'
import type { OutcomeClass } from '@/models/words'

const CONFIDENCE = 0.95
const MOST_RUNS = 100

/**
 * What a workshop's runs have shown: conversions with intervals, forecasts scored, days early or late, yields, refunds; null
 * when the actor may not see it. Four statements, whatever there is; the newest hundred runs.
 */
export async function getTrackRecord(cmd: { actor: Actor; slug: string }): Promise<TrackRecord | null> {
  const workshop = await Workshop.findOne({ where: { slug: cmd.slug } })
  if (!workshop || !can(cmd.actor, 'run:list', { workshopId: workshop.id })) return null
  const given = {
    bind: { workshopId: workshop.id },
    type: QueryTypes.SELECT as const,
  }
  const classes = await sequelize.query<{ className: OutcomeClass; converted: number; asked: number }>(
    `select class_name as "className", sum(converted)::int as converted,
            sum(converted + not_converted)::int as asked
     from outcomes where workshop_id = $workshopId group by 1
     having sum(converted + not_converted) > 0 order by 1`,
    given,
  )
  const kept = await sequelize.query<Kept>(FORECASTS, given)
  const runs = await sequelize.query<Omit<TrackRecord['runs'][number], 'daysLate'>>(RUNS, {
    ...given,
    bind: { ...given.bind, zone: workshop.timeZone },
  })
  return {
    workshop: { name: workshop.name, currency: workshop.currency, locale: workshop.locale },
    classes: classes.map(({ className, converted, asked }) => ({
      name: CLASS_OF_OUTCOME[className],
      ...{ converted, asked },
      ...wilson(converted, asked, CONFIDENCE),
    })),
    forecasts: scored(kept),
    runs: runs.map((run) => ({
      ...run,
      daysLate: run.promisedBy && run.postedOn ? daysBetween(run.promisedBy, run.postedOn) : null,
    })),
  }
}

type Kept = { chance: number; low: number; high: number; minimum: number; decided: number }

function scored(kept: readonly Kept[]): TrackRecord['forecasts'] {
  const statements = kept.map(({ chance, minimum, decided }) => ({ chance, came: decided >= minimum }))
  return {
    stated: kept.length,
    held: kept.filter(({ low, high, decided }) => low <= decided && decided <= high).length,
    brier: statements.length === 0 ? null : brierScore(statements),
    table: calibration(statements),
  }
}

/** Forecasts of runs that have been decided, with the units under deposit at the decision. */
const FORECASTS = `
  select (f.figures->>'chance')::float8 as chance, (f.figures->>'low')::int as low, (f.figures->>'high')::int as high,
         f.minimum, (d.figures->>'deposited')::int as decided
  from forecasts f join decisions d on d.run_id = f.run_id and d.kind in ('lock', 'call_off')
  where f.workshop_id = $workshopId and d.figures ? 'deposited'
    and not exists (select 1 from decisions e where e.run_id = d.run_id and e.kind in ('lock', 'call_off') and e.at < d.at)`

const RUNS = `
  select r.id, r.number, m.name as module, r.state, r.minimum,
         (select (d.figures->>'deposited')::int from decisions d
          where d.run_id = r.id and d.kind in ('lock', 'call_off') order by d.at limit 1) as deposited,
         (select max(f.posted_by_first_on) from run_offers f where f.run_id = r.id)::text as "promisedBy",
         case when sums.short = 0 then (sums.posted_at at time zone $zone)::date::text end as "postedOn",
         a.started, a.good, coalesce(sums.received, 0)::bigint as "receivedMinor",
         coalesce(sums.refunded, 0)::bigint as "refundedMinor"
  from runs r join modules m on m.id = r.module_id left join run_actuals a on a.run_id = r.id
  left join lateral (
    select max(o.posted_at) as posted_at,
           count(*) filter (where o.state in ('reserved', 'balance_due', 'paid', 'packed')) as short,
           sum((select sum(p.amount_minor) from payment_attempts p where p.order_id = o.id and p.state = 'captured')) as received,
           sum((select sum(f.amount_minor) from refunds f where f.order_id = o.id and f.state = 'succeeded')) as refunded
    from orders o where o.run_id = r.id) sums on true
  where r.workshop_id = $workshopId and r.opened_at is not null order by r.opened_at desc, r.id limit ${MOST_RUNS}`
