import 'server-only'
import { refuseFields } from '@/lib/contracts/problem'
import type { DestinationInput } from '@/lib/contracts/settings'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { settingsWords as words } from '@/lib/messages/settings'
import { Destination, Module, Offer, Workshop } from '@/models'
import { recordMove } from '../_steps/record-move'
import { workshopPagesChanged } from '../_steps/workshop-pages-changed'

/**
 * Opens, closes or pauses a country for every offer of one module, or of all. Orders placed before are not touched; while a
 * destination is paused their parcels wait.
 * Refuses: not_found · forbidden · invalid (no zone reaches the country). Locks: the workshop. Writes: destinations, audit;
 * public pages are made anew. Repeat: safe.
 */
export function saveDestination(cmd: {
  actor: Actor
  workshopId: string
  input: DestinationInput
  now: Date
}) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'destination:write', { workshopId }))
      return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!workshop) return refuse('not_found')
    const offers = await Offer.findAll({
      where: { workshopId },
      attributes: ['id'],
      include: [
        {
          model: Module,
          as: 'module',
          attributes: [],
          required: true,
          where: input.module === undefined ? {} : { slug: input.module },
        },
      ],
      transaction: tx,
    })
    if (input.module !== undefined && offers.length === 0) return refuse('not_found')
    const [changed] = await Destination.update(
      { state: input.state, reason: input.state === 'open' ? null : (input.reason ?? null) },
      { where: { offerId: offers.map(({ id }) => id), country: input.country }, transaction: tx },
    )
    if (changed === 0) return refuseFields({ country: words.unknownCountryOfZones })
    await recordMove(tx, {
      workshopId,
      subjectType: 'destination',
      subjectId: workshop.id,
      from: null,
      event: input.state,
      to: input.country,
      byPersonId: actor.personId,
      at: now,
    })
    await workshopPagesChanged(tx, workshop)
    return ok({ changed })
  })
}
