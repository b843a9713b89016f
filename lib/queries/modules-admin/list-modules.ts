import 'server-only'
import { QueryTypes } from 'sequelize'
import type { ModuleListItem } from '@/lib/contracts/module-desk'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

/** A workshop's modules by name, with what they are offered as and how much interest there is; empty for strangers. One query. */
export async function listModules(cmd: { actor: Actor; workshopId: string }): Promise<ModuleListItem[]> {
  if (!can(cmd.actor, 'module:list', { workshopId: cmd.workshopId })) return []
  return sequelize.query<ModuleListItem>(
    `select m.slug, m.name, m.one_line as "oneLine", m.state, m.width_hp as "widthHp",
            coalesce((select array_agg(o.kind order by o.position) from offers o
                      where o.module_id = m.id and o.withdrawn_at is null), '{}') as offers,
            (select count(*) from signups s where s.module_id = m.id and s.state = 'confirmed')::int as "signUps",
            (select coalesce(sum(s.quantity), 0) from signups s
             where s.module_id = m.id and s.state = 'confirmed')::int as units,
            (select count(*) from runs r where r.module_id = m.id)::int as runs
     from modules m where m.workshop_id = :workshopId order by m.state = 'archived', m.name, m.slug`,
    { replacements: { workshopId: cmd.workshopId }, type: QueryTypes.SELECT },
  )
}
