import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { OLD_AFTER_DAYS } from '@/lib/core/demand/conversion'
import { sequelize } from '@/lib/db/sequelize'
import { Outcome, type Run } from '@/models'
import type { OutcomeClass } from '@/models/words'

type Row = { className: OutcomeClass; converted: number; notConverted: number }

/**
 * Stores what became of each class of people in a run that ends, for the next forecast: of those invited, who paid a
 * deposit; of those under deposit, who paid the rest. Counted in people and orders, never in names.
 * The run is locked by the caller. Writes: outcomes. Repeat: safe; a class is stored once.
 */
export async function storeOutcomes(tx: Transaction, run: Run, now: Date): Promise<void> {
  const rows = await sequelize.query<Row>(
    `with deposited as (
       select distinct o.id, o.person_id, o.state from orders o
       join payment_attempts a on a.order_id = o.id and a.purpose = 'deposit' and a.state = 'captured'
         and a.surplus_at is null
       where o.run_id = $runId
     )
     select case when i.sent_at - s.confirmed_at > make_interval(days => $oldAfter) then 'old_signup'
                 else s.certainty end as "className",
            count(*) filter (where d.person_id is not null)::int as converted,
            count(*) filter (where d.person_id is null)::int as "notConverted"
     from invitations i join signups s on s.id = i.signup_id
     left join (select distinct person_id from deposited) d on d.person_id = i.person_id
     where i.run_id = $runId group by 1
     union all
     select 'deposit_paying', count(*) filter (where state in ('paid', 'packed', 'posted', 'withdrawn', 'returned'))::int,
            count(*) filter (where state in ('lapsed', 'cancelled'))::int
     from deposited`,
    { bind: { runId: run.id, oldAfter: OLD_AFTER_DAYS }, type: QueryTypes.SELECT, transaction: tx },
  )
  await Outcome.bulkCreate(
    rows.map((row) => ({ ...row, workshopId: run.workshopId, runId: run.id, storedAt: now })),
    { ignoreDuplicates: true, transaction: tx },
  )
}
