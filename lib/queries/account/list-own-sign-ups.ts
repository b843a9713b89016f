import 'server-only'
import type { OwnSignUp } from '@/lib/contracts/account'
import type { Actor } from '@/lib/core/policy/can'
import { Module, Offer, SignUp, Workshop } from '@/models'

/** A person's sign-ups in every workshop, newest first, at most a hundred. Two statements. */
export async function listOwnSignUps({ actor }: { actor: Actor }): Promise<OwnSignUp[]> {
  if (actor.kind !== 'person') return []
  const rows = await SignUp.findAll({
    where: { personId: actor.personId },
    include: [
      { model: Module, as: 'module', required: true, attributes: ['name', 'slug'] },
      { model: Offer, as: 'offer', required: true, attributes: ['kind'] },
    ],
    order: [['submittedAt', 'DESC']],
    limit: 100,
  })
  const workshops = await Workshop.findAll({
    where: { id: rows.map(({ workshopId }) => workshopId) },
    attributes: ['id', 'slug', 'name', 'timeZone'],
  })
  return rows.map((row) => {
    const workshop = workshops.find(({ id }) => id === row.workshopId)
    return {
      id: row.id,
      workshop: { slug: workshop?.slug ?? '', name: workshop?.name ?? '' },
      module: { slug: row.module?.slug ?? '', name: row.module?.name ?? '' },
      offer: row.offer!.kind,
      quantity: row.quantity,
      state: row.state,
      at: (row.confirmedAt ?? row.submittedAt).toISOString(),
      timeZone: workshop?.timeZone ?? 'UTC',
    }
  })
}
