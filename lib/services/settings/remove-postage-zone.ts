import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { Parcel, PostageService, PostageZone, Workshop } from '@/models'
import { openDestinations } from '../_steps/open-destinations'
import { workshopPagesChanged } from '../_steps/workshop-pages-changed'

/**
 * Takes a zone of the post away. Orders keep the postage they were quoted.
 * Refuses: not_found · forbidden · zone_in_use (parcels name a service of it). Locks: the workshop. Writes: zone, services, destinations; public pages are made
 * anew. Repeat: refused as not_found.
 */
export function removePostageZone(cmd: { actor: Actor; workshopId: string; zone: string }) {
  const { actor, workshopId } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'settings:write', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE })
    const zone = await PostageZone.findOne({
      where: { workshopId, id: cmd.zone },
      include: [{ model: PostageService, as: 'services', required: false }],
      transaction: tx,
    })
    if (!workshop || !zone) return refuse('not_found')
    const services = (zone.services ?? []).map(({ id }) => id)
    if ((await Parcel.count({ where: { serviceId: services }, transaction: tx })) > 0)
      return refuse('zone_in_use')
    await PostageService.destroy({ where: { zoneId: zone.id }, transaction: tx })
    await zone.destroy({ transaction: tx })
    await openDestinations(tx, workshopId)
    await workshopPagesChanged(tx, workshop)
    return ok({ zone: zone.id })
  })
}
