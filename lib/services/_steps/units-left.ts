import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'

const BEFORE = { packed: ['open', 'discarded'], handed_over: ['open', 'packed', 'discarded'] } as const

/**
 * Units of an order that are in no parcel packed yet, or in none handed over; replacements aside.
 * Locks: nothing; the order is locked by the caller. Writes: nothing.
 */
export async function unitsLeft(
  tx: Transaction,
  orderId: string,
  until: keyof typeof BEFORE,
): Promise<number> {
  const [row] = await sequelize.query<{ left: number }>(
    `select (sum(ol.quantity) - coalesce(sum(done.quantity), 0))::int as left from order_lines ol
     left join lateral (select sum(pl.quantity) as quantity from parcel_lines pl join parcels p on p.id = pl.parcel_id
                        where pl.order_line_id = ol.id and p.problem_id is null
                          and p.state <> all ($before::text[])) done on true
     where ol.order_id = $orderId`,
    {
      bind: { orderId, before: BEFORE[until] as unknown as string[] },
      type: QueryTypes.SELECT,
      transaction: tx,
    },
  )
  if (!row) throw new Error('unitsLeft: no answer')
  return row.left
}
