import 'server-only'
import { QueryTypes } from 'sequelize'
import type { Day } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'

export type CountryOrders = {
  country: string
  orders: number
  worthMinor: number
  currency: string
  /** Notices sent about them before. */
  notices: number
}

export type PromiseAhead = {
  run: { id: string; number: number; module: string; slug: string }
  /** The earliest promise of the run that is not kept yet. */
  postedBy: Day
  byCountry: CountryOrders[]
}

type Row = PromiseAhead['run'] & CountryOrders & { postedBy: Day }

/** Locked runs with orders still to be posted whose promise falls due by a day, their orders counted by country; one statement. */
export async function readPromises(workshopId: string, until: Day): Promise<PromiseAhead[]> {
  const rows = await sequelize.query<Row>(
    `with waiting as (
       select o.id, o.run_id, o.country, o.currency, o.total_minor,
              min(coalesce(l.revised_posted_by_on, l.posted_by_on)) as promised
       from orders o join order_lines l on l.order_id = o.id join runs r on r.id = o.run_id
       where o.workshop_id = $workshopId and r.state = 'locked' and o.kind = 'paid'
         and o.state in ('reserved', 'balance_due', 'paid', 'packed')
       group by o.id
     )
     select r.id, r.number, m.name as module, m.slug, w.country, w.currency,
            (min(min(w.promised)) over (partition by r.id))::text as "postedBy",
            count(*)::int as orders, sum(w.total_minor)::bigint as "worthMinor",
            (select count(*)::int from notices n where n.run_id = r.id and n.kind = 'delay') as notices
     from waiting w join runs r on r.id = w.run_id join modules m on m.id = r.module_id
     where w.promised <= $until group by r.id, m.id, w.country, w.currency
     order by "postedBy", r.id, orders desc, w.country`,
    { bind: { workshopId, until }, type: QueryTypes.SELECT },
  )
  const runs = new Map<string, PromiseAhead>()
  for (const { id, number, module, slug, postedBy, ...orders } of rows) {
    const known = runs.get(id) ?? { run: { id, number, module, slug }, postedBy, byCountry: [] }
    runs.set(id, { ...known, byCountry: [...known.byCountry, orders] })
  }
  return [...runs.values()]
}
