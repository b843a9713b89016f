import 'server-only'
import type { RunTemplate } from '@/lib/contracts/run-page'
import { can, type Actor } from '@/lib/core/policy/can'
import { dayIn } from '@/lib/core/time/zone'
import { Module, Offer, Revision, Workshop } from '@/models'

/** What a new run of a module is drafted from; null when the actor may not draft one, or there is no such module. */
export async function getRunTemplate(cmd: {
  actor: Actor
  workshopId: string
  module: string
  now: Date
}): Promise<RunTemplate | null> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'run:create', { workshopId })) return null
  const workshop = await Workshop.findByPk(workshopId)
  const module = await Module.findOne({
    where: { workshopId, slug: cmd.module },
    include: [
      { model: Revision, as: 'revisions', required: false },
      { model: Offer, as: 'offers', required: false, where: { withdrawnAt: null } },
    ],
  })
  if (!workshop || !module) return null
  const offers = [...(module.offers ?? [])].sort((a, b) => a.position - b.position)
  // Newest first: AA after Z.
  const revisions = [...(module.revisions ?? [])].sort(
    ({ letter: a }, { letter: b }) => b.length - a.length || (a < b ? 1 : -1),
  )
  return {
    module: { slug: module.slug, name: module.name, state: module.state },
    revisions: revisions.map(({ letter, state }) => ({ letter, state })),
    offers: offers.map(({ kind, priceMinor, depositMinor }) => ({ offer: kind, priceMinor, depositMinor })),
    currency: workshop.currency,
    headStartHours: workshop.headStartHours,
    today: dayIn(cmd.now, workshop.timeZone),
  }
}
