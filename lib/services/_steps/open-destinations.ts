import 'server-only'
import type { Transaction } from 'sequelize'
import { COUNTRIES } from '@/lib/core/data/countries'
import { Destination, Module, Offer, PostageZone } from '@/models'

/**
 * Opens every country of the workshop's zones for every offer that says nothing about it yet, and forgets open ones no
 * zone reaches any more. What was closed or paused, and what carries a note, stays as the owner left it.
 * Locks: nothing; the caller holds the workshop. Writes: destinations. Repeat: safe.
 */
export async function openDestinations(tx: Transaction, workshopId: string): Promise<void> {
  const zones = await PostageZone.findAll({ where: { workshopId }, transaction: tx })
  const offers = await Offer.findAll({
    where: { workshopId },
    include: [
      { model: Module, as: 'module', attributes: ['id'], required: true },
      { model: Destination, as: 'destinations', required: false },
    ],
    transaction: tx,
  })
  const reached = reachedBy(zones)
  for (const offer of offers) {
    const known = offer.destinations ?? []
    const missing = [...reached].filter((country) => !known.some((each) => each.country === country))
    await Destination.bulkCreate(
      missing.map((country) => ({ workshopId, offerId: offer.id, country })),
      { transaction: tx },
    )
    const stale = known.filter(
      ({ country, state, note }) => state === 'open' && note === '' && !reached.has(country),
    )
    if (stale.length > 0)
      await Destination.destroy({ where: { id: stale.map(({ id }) => id) }, transaction: tx })
  }
}

function reachedBy(zones: readonly PostageZone[]): Set<string> {
  const named = zones.flatMap(({ countries }) => countries)
  return new Set(named.includes('*') ? Object.keys(COUNTRIES) : named)
}
