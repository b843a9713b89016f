import 'server-only'
import { QueryTypes } from 'sequelize'
import type { StoppedOrder } from '@/lib/contracts/packing'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

const MOST = 100

/**
 * Paid and packed orders that cannot go on now, each with the gravest reason; the first hundred by number. An order that
 * waits in no open parcel without another reason waits for units, or was opened up since and can be looked at again.
 * One statement.
 */
export async function listStoppedOrders(cmd: { actor: Actor; workshopId: string }): Promise<StoppedOrder[]> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'packing:read', { workshopId })) return []
  const rows = await sequelize.query<Omit<StoppedOrder, 'number'> & { number: number }>(
    `select * from (
       select o.id as "order", o.number, o.country,
         case when o.disputed_at is not null then 'order_disputed'
              when o.address_id is null then 'no_address'
              when exists (select from order_lines ol join run_offers ro on ro.id = ol.run_offer_id
                           join destinations d on d.offer_id = ro.offer_id
                           where ol.order_id = o.id and d.country = o.country and d.state = 'paused')
                then 'destination_paused'
              when exists (select from order_lines ol join parcel_lines pl on pl.order_line_id = ol.id
                           join parcels p on p.id = pl.parcel_id
                           where ol.order_id = o.id and p.state in ('open', 'packed') and p.on_hold_reason is not null)
                then 'on_hold'
              when o.state = 'paid' and (select sum(quantity) from order_lines where order_id = o.id) >
                   (select coalesce(sum(pl.quantity), 0) from order_lines ol join parcel_lines pl on pl.order_line_id = ol.id
                    join parcels p on p.id = pl.parcel_id
                    where ol.order_id = o.id and p.problem_id is null and p.state <> 'discarded')
                then 'not_yet' end as reason
       from orders o where o.workshop_id = $workshopId and o.state in ('paid', 'packed')) stopped
     where reason is not null order by number limit $most`,
    { bind: { workshopId, most: MOST }, type: QueryTypes.SELECT },
  )
  return rows.map((row) => ({ ...row, number: String(row.number) }))
}
