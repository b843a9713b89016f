import 'server-only'
import { type Transaction } from 'sequelize'
import { packingMistakes as words } from '@/lib/messages/packing'
import { type Parcel, PostageService, PostageZone } from '@/models'

type Chosen = { name: string; service: PostageService | null; mistake: string | null }

const isFor = (zone: PostageZone, country: string) => zone.countries.includes(country)

/**
 * The service a packer chose by id or name among those of the country's zone, or the name as typed where it is none of
 * them; with what is wrong with it for this parcel.
 * Locks: nothing. Writes: nothing.
 */
export async function chooseService(
  tx: Transaction,
  parcel: Parcel,
  country: string,
  typed: string,
): Promise<Chosen> {
  const zones = await PostageZone.findAll({
    where: { workshopId: parcel.workshopId },
    include: [{ model: PostageService, as: 'services', where: { endedAt: null }, required: false }],
    order: [
      ['position', 'ASC'],
      [{ model: PostageService, as: 'services' }, 'position', 'ASC'],
    ],
    transaction: tx,
  })
  const named = zones.filter((zone) => isFor(zone, country))
  const own = named.length > 0 ? named : zones.filter((zone) => isFor(zone, '*'))
  const wanted = typed.toLowerCase()
  const service = own
    .flatMap((zone) => zone.services ?? [])
    .find(({ id, name }) => id === wanted || name.toLowerCase() === wanted)
  if (service) return { name: service.name, service, mistake: misfit(parcel, service) }
  const isElsewhere = zones.flatMap((zone) => zone.services ?? []).some(({ id }) => id === wanted)
  return { name: typed, service: null, mistake: isElsewhere ? words.serviceElsewhere : null }
}

function misfit(parcel: Parcel, service: PostageService): string | null {
  const { grams, lengthMm, widthMm, heightMm } = parcel
  if (grams !== null && grams > service.maxGrams) return words.tooHeavy(service.name, service.maxGrams, grams)
  const longest = Math.max(lengthMm ?? 0, widthMm ?? 0, heightMm ?? 0)
  return longest > service.maxMm ? words.tooLarge(service.name, service.maxMm) : null
}
