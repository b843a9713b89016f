import 'server-only'
import { QueryTypes } from 'sequelize'
import type { RunListItem } from '@/lib/contracts/runs'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

const PAGE = 50

type Row = Omit<RunListItem, 'module'> & { slug: string; name: string; createdAt: Date }

/**
 * A workshop's runs, newest first, with the units under deposit of each; empty for who may not see them. One statement.
 * `next` is handed back as `after` for the following page; null at the end.
 */
export async function listRuns(cmd: {
  actor: Actor
  workshopId: string
  after?: string | undefined
}): Promise<{ items: RunListItem[]; next: string | null }> {
  if (!can(cmd.actor, 'run:list', { workshopId: cmd.workshopId })) return { items: [], next: null }
  const rows = await sequelize.query<Row>(
    `select r.id, r.number, m.slug, m.name, v.letter as revision, r.state, r.minimum, r.maximum,
            r.decide_by_on::text as "decideBy", r.created_at as "createdAt",
            coalesce((select sum(o.unit_count) from orders o where o.run_id = r.id and o.kind = 'paid'
                      and o.state in ('reserved', 'balance_due', 'paid', 'packed', 'posted')), 0)::int as deposited
     from runs r join modules m on m.id = r.module_id join revisions v on v.id = r.revision_id
     where r.workshop_id = $workshopId
       and ($after::uuid is null
            or (r.created_at, r.id) < (select a.created_at, a.id from runs a where a.id = $after::uuid))
     order by r.created_at desc, r.id desc limit ${PAGE + 1}`,
    { bind: { workshopId: cmd.workshopId, after: cmd.after ?? null }, type: QueryTypes.SELECT },
  )
  const shown = rows.slice(0, PAGE)
  return {
    items: shown.map(({ slug, name, createdAt: _, ...row }) => ({ ...row, module: { slug, name } })),
    next: rows.length > PAGE ? (shown.at(-1)?.id ?? null) : null,
  }
}
