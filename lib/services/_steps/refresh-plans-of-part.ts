import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { refreshPlanParts } from './refresh-plan-parts'

/**
 * Brings what was learned of a part into the base plan of every module whose list names it. Plans of runs keep the list they
 * were saved with, and say so.
 * Locks: nothing. Writes: plans. Repeat: safe. As many statements as modules use the part.
 */
export async function refreshPlansOfPart(
  tx: Transaction,
  { partId, byPersonId, now }: { partId: string; byPersonId: string; now: Date },
): Promise<void> {
  const modules = await sequelize.query<{ id: string }>(
    `select distinct r.module_id as id from revision_lines l join revisions r on r.id = l.revision_id
     where l.part_id = $partId`,
    { bind: { partId }, type: QueryTypes.SELECT, transaction: tx },
  )
  for (const { id } of modules) await refreshPlanParts(tx, { moduleId: id, byPersonId, now })
}
