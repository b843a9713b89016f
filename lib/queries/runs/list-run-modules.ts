import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { Module } from '@/models'

/** The modules a run can be drafted of, by name; empty for who may not draft one. */
export async function listRunModules(cmd: {
  actor: Actor
  workshopId: string
}): Promise<{ slug: string; name: string }[]> {
  if (!can(cmd.actor, 'run:create', { workshopId: cmd.workshopId })) return []
  const modules = await Module.findAll({
    where: { workshopId: cmd.workshopId, state: ['draft', 'published'] },
    attributes: ['slug', 'name'],
    order: [['name', 'ASC']],
  })
  return modules.map(({ slug, name }) => ({ slug, name }))
}
