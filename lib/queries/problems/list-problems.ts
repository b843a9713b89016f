import 'server-only'
import { QueryTypes } from 'sequelize'
import type { ProblemView } from '@/lib/contracts/problems'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

const MOST = 100

type Row = Omit<ProblemView, 'openedAt'> & { openedAt: Date }

const SELECT = `
  select p.id as problem, p.number, p.order_id as "order", o.number::text as "orderNumber", p.kind, p.story, p.state,
         p.remedy, p.answer, p.opened_at as "openedAt", p.answer_by_on::text as "answerBy", o.currency
  from problems p join orders o on o.id = p.order_id`

const asView = ({ openedAt, ...row }: Row): ProblemView => ({ ...row, openedAt: openedAt.toISOString() })

/** Problems of a workshop, unanswered first, the longest waiting on top; nothing for who may not read them. One statement. */
export async function listProblems(cmd: { actor: Actor; workshopId: string }): Promise<ProblemView[]> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'problem:list', { workshopId })) return []
  const rows = await sequelize.query<Row>(
    `${SELECT} where p.workshop_id = $workshopId order by p.state <> 'open', p.answer_by_on, p.number limit $most`,
    { bind: { workshopId, most: MOST }, type: QueryTypes.SELECT },
  )
  return rows.map(asView)
}

/** What was reported of an order the caller may read, oldest first. One statement. */
export async function listOrderProblems(orderId: string): Promise<ProblemView[]> {
  const rows = await sequelize.query<Row>(`${SELECT} where p.order_id = $orderId order by p.number`, {
    bind: { orderId },
    type: QueryTypes.SELECT,
  })
  return rows.map(asView)
}
