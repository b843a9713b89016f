import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'

/** The answers a module's choices can be given, by their label in small letters; the first offer's where two are alike. One query. */
export async function listAnswers(moduleId: string, tx?: Transaction): Promise<Map<string, string>> {
  const rows = await sequelize.query<{ id: string; label: string }>(
    `select a.id, a.label from choice_answers a join choices c on c.id = a.choice_id
     join offers o on o.id = c.offer_id
     where o.module_id = $moduleId and c.retired_at is null order by o.position desc, a.position desc`,
    { bind: { moduleId }, type: QueryTypes.SELECT, ...(tx && { transaction: tx }) },
  )
  return new Map(rows.map(({ id, label }) => [label.toLowerCase(), id]))
}
