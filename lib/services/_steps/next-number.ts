import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import type { CounterSeries } from '@/models/words'

/**
 * The next number of a series of a workshop. Taken under the counter's row lock, so that a rolled-back transaction leaves
 * no gap.
 * Locks: the counter, until the transaction ends. Writes: the counter. Repeat: the number after.
 */
export async function nextNumber(
  tx: Transaction,
  workshopId: string,
  series: CounterSeries,
): Promise<number> {
  const [row] = await sequelize.query<{ last: number }>(
    `insert into counters (workshop_id, series, last) values ($workshopId, $series, 1)
     on conflict (workshop_id, series) do update set last = counters.last + 1 returning last`,
    { bind: { workshopId, series }, type: QueryTypes.SELECT, transaction: tx },
  )
  if (!row) throw new Error(`nextNumber: no ${series} counter`)
  return row.last
}
