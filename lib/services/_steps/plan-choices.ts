import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import type { PlanChoice } from '@/lib/core/costs/plan-selling'
import { sequelize } from '@/lib/db/sequelize'

type Row = { choiceId: string; offer: string; id: string; surcharge: number }

/**
 * The questions a module asks as the cost plan wants them. Units fall on the answers evenly: who will choose what is not
 * known before anybody has.
 * Locks: nothing. Writes: nothing. One query.
 */
export async function planChoices(tx: Transaction, moduleId: string): Promise<PlanChoice[]> {
  const rows = await sequelize.query<Row>(
    `select c.id as "choiceId", o.kind as offer, a.id, a.surcharge_minor::bigint as surcharge
     from choices c join offers o on o.id = c.offer_id join choice_answers a on a.choice_id = c.id
     where o.module_id = $moduleId and c.retired_at is null order by c.position, c.id, a.position`,
    { bind: { moduleId }, type: QueryTypes.SELECT, transaction: tx },
  )
  const ids = [...new Set(rows.map(({ choiceId }) => choiceId))]
  return ids.map((choiceId) => {
    const own = rows.filter((row) => row.choiceId === choiceId)
    return {
      offer: own[0]!.offer,
      answers: own.map(({ id, surcharge }) => ({ id, weight: 1, surcharge })),
    }
  })
}
