import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { Membership, Person } from '@/models'

/** Who packs in a workshop, for handing a batch to somebody; nobody for who may not. One statement. */
export async function listPackers(cmd: {
  actor: Actor
  workshopId: string
}): Promise<{ person: string; name: string }[]> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'batch:assign', { workshopId })) return []
  const members = await Membership.findAll({
    where: { workshopId, role: ['packer', 'owner'], endedAt: null },
    include: [{ model: Person, as: 'person', attributes: ['id', 'name'], required: true }],
    order: [['createdAt', 'ASC']],
  })
  return members.map(({ person }) => ({ person: person!.id, name: person!.name ?? '' }))
}
