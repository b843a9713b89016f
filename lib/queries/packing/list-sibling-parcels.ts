import 'server-only'
import { QueryTypes } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'

/** The place of each parcel among those of its order, replacements and discarded ones aside. One statement. */
export async function listSiblingParcels(
  parcelIds: readonly string[],
): Promise<Map<string, { nth: number; of: number }>> {
  if (parcelIds.length === 0) return new Map()
  const rows = await sequelize.query<{ id: string; nth: number; of: number }>(
    `select id, nth, of from (
       select x.id, row_number() over (partition by x.order_id order by x.number)::int as nth,
              count(*) over (partition by x.order_id)::int as of
       from (select distinct p.id, p.number, ol.order_id from parcels p join parcel_lines pl on pl.parcel_id = p.id
             join order_lines ol on ol.id = pl.order_line_id
             where p.state <> 'discarded' and p.problem_id is null
               and ol.order_id in (select l.order_id from parcel_lines k join order_lines l on l.id = k.order_line_id
                                   where k.parcel_id = any ($ids::uuid[]))) x) placed
     where id = any ($ids::uuid[])`,
    { bind: { ids: parcelIds as string[] }, type: QueryTypes.SELECT },
  )
  return new Map(rows.map(({ id, nth, of }) => [id, { nth, of }]))
}
