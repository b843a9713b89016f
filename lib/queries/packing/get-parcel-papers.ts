import 'server-only'
import type { ParcelCustoms, ParcelPaper, ParcelPapers } from '@/lib/contracts/papers'
import { can, type Actor } from '@/lib/core/policy/can'
import { formatAddress } from '@/lib/core/post/address'
import { isAddressShown } from '@/lib/core/post/address-shown'
import { declareParcel } from '@/lib/queries/packing/declare-parcel'
import { contentsOf, findParcels } from '@/lib/queries/packing/find-parcels'
import { getPaperIssue } from '@/lib/queries/packing/get-fulfilment-orders'
import { senderOf } from '@/lib/queries/packing/get-packing-slips'
import { writtenChoice } from '@/lib/queries/packing/list-pack-queue'
import { listSiblingParcels } from '@/lib/queries/packing/list-sibling-parcels'
import { Destination, type Parcel, PostageService, type Workshop } from '@/models'

type Known = {
  workshop: Workshop
  signedBy: string
  signedOn: string
  places: Map<string, { nth: number; of: number }>
  dutiesOf: (parcel: Parcel) => ParcelCustoms['duties']
  kindOf: (parcel: Parcel) => 'letter' | 'parcel'
}

/**
 * What labels, customs forms, invoices, return slips and hand-over lists state of parcels, in the order given; those taken
 * apart or arrived more than thirty days ago are left out. Null for who may not print. Bounded: a statement per table, however many parcels.
 */
export async function getParcelPapers(cmd: {
  actor: Actor
  workshopId: string
  parcelIds: readonly string[]
  now: Date
}): Promise<(ParcelPapers & { usesLetter: boolean }) | null> {
  const { actor, workshopId, parcelIds, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'paper:print', { workshopId })) return null
  const found = await findParcels({ id: [...parcelIds], workshopId })
  const byId = new Map(found.map((parcel) => [parcel.id, parcel]))
  const parcels = parcelIds
    .flatMap((id) => byId.get(id) ?? [])
    .filter(({ state, deliveredAt }) => state !== 'discarded' && isAddressShown({ deliveredAt, now }))
  const { row: workshop, ...issue } = await getPaperIssue({ actor, workshopId, now })
  const known: Known = {
    workshop,
    signedBy: issue.printedBy,
    signedOn: issue.printedOn,
    places: await listSiblingParcels(parcelIds),
    dutiesOf: await dutiesOf(parcels),
    kindOf: await kindsOf(workshopId),
  }
  return {
    ...issue,
    from: senderOf(workshop),
    fromPhone: workshop.phone,
    fromTaxNumber: workshop.taxNumber,
    parcels: parcels.map((parcel) => asPaper(parcel, known)),
  }
}

async function dutiesOf(parcels: readonly Parcel[]): Promise<Known['dutiesOf']> {
  const offersOf = (parcel: Parcel) => contentsOf(parcel).map(({ line }) => line.runOffer!.offerId)
  const rows = await Destination.findAll({ where: { offerId: [...new Set(parcels.flatMap(offersOf))] } })
  return (parcel) =>
    rows.find(
      ({ offerId, country }) => country === parcel.address?.country && offersOf(parcel).includes(offerId),
    )?.duties ?? 'none'
}

/** By the service that was quoted; letters and parcels have different forms. */
async function kindsOf(workshopId: string): Promise<Known['kindOf']> {
  const services = await PostageService.findAll({ where: { workshopId }, attributes: ['id', 'kind'] })
  return (parcel) => {
    const id = parcel.serviceId ?? contentsOf(parcel)[0]?.line.order?.postageQuote?.serviceId
    return services.find((service) => service.id === id)?.kind ?? 'parcel'
  }
}

function asPaper(parcel: Parcel, known: Known): ParcelPaper {
  const { workshop, places, dutiesOf: duties, kindOf, signedBy, signedOn } = known
  const contents = contentsOf(parcel)
  const order = contents[0]?.line.order
  if (!order || !parcel.address) throw new Error(`the parcel ${parcel.id} has no order or address`)
  const address = parcel.address.facts()
  const to = formatAddress(address, { script: 'latin', from: workshop.country })
  const own = formatAddress(address, { script: 'own', from: workshop.country })
  const grams = parcel.grams ?? parcel.expectedGrams
  return {
    parcel: parcel.id,
    number: parcel.number,
    orderNumber: [...new Set(contents.map(({ line }) => String(line.order!.number)))].join(', '),
    place: places.get(parcel.id) ?? { nth: 1, of: 1 },
    isReplacement: parcel.problemId !== null,
    to,
    toOwnScript: own.join('\n') === to.join('\n') ? null : own,
    country: address.country,
    phone: address.phone ?? null,
    taxNumber: address.taxNumber ?? null,
    service: parcel.serviceName ?? order.postageQuote?.serviceName ?? null,
    tracking: parcel.tracking,
    grams,
    lines: contents.map(({ line, quantity, serials }) => ({
      module: line.order?.run?.module?.name ?? '',
      offer: line.offerKind,
      quantity,
      choices: line.choices.map(writtenChoice),
      serials,
    })),
    customs: declareParcel({
      ...{ parcel, contents, workshop, grams, signedBy, signedOn },
      duties: duties(parcel),
      kind: kindOf(parcel),
    }),
  }
}
