import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import type { Run } from '@/models'
import type { NewcomerFacts, RunFacts } from './run-facts'
import { daysOpenToAll, windowOf } from './window-of'

/** Whoever ordered though no confirmed sign-up of theirs was there before, and is or was under deposit. */
const NEWCOMERS = `
  from orders o join runs r on r.id = o.run_id
  where o.kind = 'paid'
    and exists (select 1 from payment_attempts a where a.order_id = o.id and a.purpose = 'deposit'
                and a.state = 'captured' and a.surplus_at is null)
    and not exists (select 1 from signups s where s.module_id = r.module_id and s.person_id = o.person_id
                    and s.confirmed_at <= o.placed_at)`

/**
 * How a run's window runs, when the deposits of earlier runs of its workshop came within theirs, and who came that was on no
 * list, here and there. Three statements; earlier deposits as counts per thousandth of a window.
 */
export async function readArrivals(
  run: Run,
  now: Date,
  tx: Transaction | null,
): Promise<Pick<RunFacts, 'window' | 'arrivalsSeen' | 'newcomers'>> {
  const how = {
    bind: { runId: run.id, workshopId: run.workshopId },
    type: QueryTypes.SELECT,
    transaction: tx,
  } as const
  const seen = await sequelize.query<{ part: number; deposits: number }>(
    `select round(least(1, greatest(0, extract(epoch from coalesce(a.ended_at, a.requested_at) - r.opened_at)
              / nullif(extract(epoch from r.decide_by_at - r.opened_at), 0)))::numeric, 3)::float8 as part,
            count(*)::int as deposits
     from payment_attempts a join orders o on o.id = a.order_id join runs r on r.id = o.run_id
     where r.workshop_id = $workshopId and r.id <> $runId and r.state in ('locked', 'closed', 'called_off')
       and a.purpose = 'deposit' and a.state = 'captured' and a.surplus_at is null and r.decide_by_at > r.opened_at
     group by 1 order by 1`,
    how,
  )
  const here = await sequelize.query<NewcomerFacts['here'][number]>(
    `select l.offer_kind as offer, l.quantity, count(*)::int as people
     from order_lines l join orders own on own.id = l.order_id
     where own.id in (select o.id ${NEWCOMERS} and o.run_id = $runId) group by 1, 2 order by 1, 2`,
    how,
  )
  const [before] = await sequelize.query<NewcomerFacts['before']>(
    `select (select count(*)::int ${NEWCOMERS} and r.workshop_id = $workshopId and r.id <> $runId
               and r.state in ('locked', 'closed', 'called_off')) as people,
            (select coalesce(sum(greatest(0, extract(epoch from
                 least(r.decide_by_at, coalesce(r.locked_at, r.called_off_at)) - r.opens_to_all_at) / 86400)), 0)::float8
             from runs r where r.workshop_id = $workshopId and r.id <> $runId
               and r.state in ('locked', 'closed', 'called_off') and r.opens_to_all_at is not null) as days`,
    how,
  )
  return {
    window: windowOf(run, now),
    arrivalsSeen: seen.flatMap(({ part, deposits }) => Array.from({ length: deposits }, () => part)),
    newcomers: { here, daysHere: daysOpenToAll(run, now), before: before ?? { people: 0, days: 0 } },
  }
}
