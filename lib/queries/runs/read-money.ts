import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import type { Run } from '@/models'
import type { RunFacts } from './run-facts'

/**
 * What of a workshop's captured payments is still here: of the run, and of everyone who would have to be paid back today
 * (this run, and its runs that take deposits; their money lies in one balance). A refund that the provider has not got
 * yet still needs its money. One statement.
 */
export async function readMoney(run: Run, tx: Transaction | null): Promise<RunFacts['money']> {
  const [row] = await sequelize.query<RunFacts['money']>(
    `with kept as (
       select o.run_id, case when r.id = $runId or r.state = 'taking_deposits'
           then a.amount_minor - coalesce(gone.sum, 0) else coalesce(asked.sum, 0) end as left_minor
       from payment_attempts a join orders o on o.id = a.order_id join runs r on r.id = o.run_id
       left join lateral (select sum(amount_minor) from refunds f
         where f.attempt_id = a.id and f.state in ('sent', 'pending', 'succeeded')) gone on true
       left join lateral (select sum(amount_minor) from refunds f
         where f.attempt_id = a.id and f.state in ('requested', 'unknown')) asked on true
       where a.workshop_id = $workshopId and a.state = 'captured' and a.currency = $currency
         and o.disputed_at is null
     )
     select coalesce(sum(left_minor) filter (where run_id = $runId), 0)::bigint as "heldMinor",
            coalesce(sum(left_minor), 0)::bigint as "owedMinor",
            count(*) filter (where left_minor > 0)::int as "owedPayments"
     from kept`,
    {
      bind: { workshopId: run.workshopId, runId: run.id, currency: run.currency },
      type: QueryTypes.SELECT,
      transaction: tx,
    },
  )
  return row ?? { heldMinor: 0, owedMinor: 0, owedPayments: 0 }
}
