import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import type { OrderSums, OrderTally } from './run-facts'

/** A run's orders, counted in two statements: units by state, offer and country; orders and sums by state. */
export async function readOrders(
  runId: string,
  tx: Transaction | null,
): Promise<{ orders: OrderTally[]; sums: OrderSums[] }> {
  const how = { bind: { runId }, type: QueryTypes.SELECT, transaction: tx } as const
  const orders = await sequelize.query<OrderTally>(
    `select o.state, o.kind, l.offer_kind as offer, o.country, sum(l.quantity)::int as units
     from orders o join order_lines l on l.order_id = o.id
     where o.run_id = $runId group by 1, 2, 3, 4`,
    how,
  )
  const sums = await sequelize.query<OrderSums>(
    `select state, kind, count(*)::int as orders, sum(balance_minor)::bigint as "balanceMinor"
     from orders where run_id = $runId group by 1, 2`,
    how,
  )
  return { orders, sums }
}
