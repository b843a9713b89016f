import 'server-only'
import { QueryTypes } from 'sequelize'
import type { PublicRecord } from '@/lib/contracts/module-page'
import type { Day } from '@/lib/core/brand'
import { daysBetween } from '@/lib/core/time/day'
import { sequelize } from '@/lib/db/sequelize'

type Ended = {
  calledOffOn: Day | null
  promisedOn: Day
  postedOn: Day | null
  refundedOn: Day | null
  owedMinor: number
}

/**
 * How a workshop's earlier runs went, oldest first: those whose last parcel is posted, and those called off after they
 * had opened. Days are the workshop's own. One statement.
 */
export async function getPublicRecord(workshop: { id: string; timeZone: string }): Promise<PublicRecord> {
  const runs = await sequelize.query<Ended>(
    `select (r.called_off_at at time zone :zone)::date::text as "calledOffOn",
            (select max(o.posted_by_first_on) from run_offers o where o.run_id = r.id)::text as "promisedOn",
            (max(o.posted_at) at time zone :zone)::date::text as "postedOn",
            (select max(f.succeeded_at) at time zone :zone from refunds f join orders p on p.id = f.order_id
              where p.run_id = r.id and f.state = 'succeeded')::date::text as "refundedOn",
            (coalesce((select sum(a.amount_minor) from payment_attempts a join orders p on p.id = a.order_id
                        where p.run_id = r.id and a.state = 'captured'), 0)
             - coalesce((select sum(f.amount_minor) from refunds f join orders p on p.id = f.order_id
                        where p.run_id = r.id and f.state = 'succeeded'), 0))::bigint as "owedMinor"
     from runs r left join orders o on o.run_id = r.id
     where r.workshop_id = :workshopId and r.opened_at is not null
     group by r.id
     having r.state = 'called_off'
        or (r.state in ('locked', 'closed') and count(o.posted_at) > 0
            and count(*) filter (where o.state in ('reserved', 'balance_due', 'paid', 'packed')) = 0)
     order by r.opened_at`,
    { replacements: { workshopId: workshop.id, zone: workshop.timeZone }, type: QueryTypes.SELECT },
  )
  const posted = runs.filter((run) => run.calledOffOn === null)
  const calledOff = runs.filter((run) => run.calledOffOn !== null)
  return {
    daysLate: posted.map(({ promisedOn, postedOn }) => daysBetween(promisedOn, postedOn!)),
    repaidInDays: calledOff.map(({ calledOffOn, refundedOn, owedMinor }) =>
      owedMinor > 0 ? null : refundedOn === null ? 0 : Math.max(0, daysBetween(calledOffOn!, refundedOn)),
    ),
  }
}
