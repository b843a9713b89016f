import 'server-only'
import { QueryTypes } from 'sequelize'
import type { PackSummary } from '@/lib/contracts/packing'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { QUEUE_FROM } from '@/lib/queries/packing/in-queue'

/**
 * How much waits, how much is packed, where it goes, and how many orders of each run under way are posted. Null for who may
 * not read the queue. Two statements.
 */
export async function getPackSummary(cmd: { actor: Actor; workshopId: string }): Promise<PackSummary | null> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'packing:read', { workshopId })) return null
  const bind = { workshopId }
  const [counts] = await sequelize.query<
    Pick<PackSummary, 'toPack' | 'packed' | 'countries' | 'choices' | 'services'>
  >(
    `select count(distinct p.id)::int as "toPack",
            coalesce(array_agg(distinct a.country order by a.country), '{}') as countries,
            coalesce(array_agg(distinct o.postage_quote ->> 'serviceName')
                     filter (where o.postage_quote is not null), '{}') as services,
            coalesce((select array_agg(distinct concat(c ->> 'question', ': ', c ->> 'label'))
                      from parcels p2 join parcel_lines pl2 on pl2.parcel_id = p2.id
                      join order_lines ol2 on ol2.id = pl2.order_line_id, jsonb_array_elements(ol2.choices) c
                      where p2.workshop_id = $workshopId and p2.state = 'open'), '{}') as choices,
            (select count(*)::int from parcels where workshop_id = $workshopId and state = 'packed') as packed
     from ${QUEUE_FROM}`,
    { bind, type: QueryTypes.SELECT },
  )
  const progress = await sequelize.query<PackSummary['progress'][number]>(
    `select r.id as run, m.name as module, r.number, count(o.posted_at)::int as posted, count(*)::int as total
     from runs r join modules m on m.id = r.module_id join orders o on o.run_id = r.id
     where r.workshop_id = $workshopId and r.state = 'locked'
       and o.state in ('reserved', 'balance_due', 'paid', 'packed', 'posted', 'withdrawn', 'returned')
     group by r.id, m.name having count(*) filter (where o.state in ('paid', 'packed', 'posted')) > 0
     order by m.name, r.number`,
    { bind, type: QueryTypes.SELECT },
  )
  if (!counts) throw new Error('getPackSummary: no counts')
  return { ...counts, progress }
}
