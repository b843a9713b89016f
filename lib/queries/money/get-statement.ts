import 'server-only'
import { QueryTypes } from 'sequelize'
import type { Statement, StatementLine } from '@/lib/contracts/money-desk'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

const LIMIT = 500

/**
 * What the books say of one order or one run: every movement with what it did to each account, oldest first (the newest 500
 * of a run), and what stands on each account in the end. Null for who may not see it. Two statements.
 */
export async function getStatement(asked: {
  actor: Actor
  workshopId: string
  orderId?: string
  runId?: string
}): Promise<Statement | null> {
  const { actor, workshopId, orderId = null, runId = null } = asked
  if (!can(actor, 'ledger:read', { workshopId })) return null
  const bind = { workshopId, orderId, runId }
  const lines = await sequelize.query<Omit<StatementLine, 'at'> & { at: Date }>(
    `select * from (
       select t.id, t.at, t.kind, o.number as "orderNumber", t.order_id as "order",
              json_agg(json_build_object('account', e.account, 'currency', e.currency, 'amountMinor', e.amount_minor)
                order by e.position) as entries
       from ledger_transfers t join ledger_entries e on e.transfer_id = t.id left join orders o on o.id = t.order_id
       where t.workshop_id = $workshopId and ($orderId::uuid is null or t.order_id = $orderId)
         and ($runId::uuid is null or t.run_id = $runId)
       group by t.id, o.number order by t.at desc, t.id desc limit ${LIMIT}) newest
     order by at, id`,
    { bind, type: QueryTypes.SELECT },
  )
  const sums = await sequelize.query<Statement['sums'][number]>(
    `select e.account, e.currency, sum(e.amount_minor)::bigint as "amountMinor"
     from ledger_transfers t join ledger_entries e on e.transfer_id = t.id
     where t.workshop_id = $workshopId and ($orderId::uuid is null or t.order_id = $orderId)
       and ($runId::uuid is null or t.run_id = $runId)
     group by 1, 2 having sum(e.amount_minor) <> 0 order by 1, 2`,
    { bind, type: QueryTypes.SELECT },
  )
  return { lines: lines.map((line) => ({ ...line, at: line.at.toISOString() })), sums }
}
