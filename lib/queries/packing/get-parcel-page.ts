import 'server-only'
import type { ParcelPage } from '@/lib/contracts/packing'
import { can, type Actor } from '@/lib/core/policy/can'
import { formatAddress } from '@/lib/core/post/address'
import { isAddressShown } from '@/lib/core/post/address-shown'
import { weightCheck } from '@/lib/core/post/weight-check'
import { mayGoOut } from '@/lib/core/states/parcel-guards'
import { contentsOf, findParcels } from '@/lib/queries/packing/find-parcels'
import { writtenChoice } from '@/lib/queries/packing/list-pack-queue'
import { listSiblingParcels } from '@/lib/queries/packing/list-sibling-parcels'
import {
  Destination,
  type Order,
  PackBatch,
  type Parcel,
  Person,
  PostageService,
  PostageZone,
  Unit,
  Workshop,
} from '@/models'

/**
 * One parcel for its packer: the address, the lines, what the scale should say, the services to its country. Null when
 * the workshop has none such, or the actor may not see it. Bounded: a statement per table.
 */
export async function getParcelPage(cmd: {
  actor: Actor
  workshopId: string
  parcelId: string
  now: Date
}): Promise<ParcelPage | null> {
  const { actor, workshopId, parcelId, now } = cmd
  if (!can(actor, 'parcel:read', { workshopId })) return null
  const [parcel] = await findParcels({ id: parcelId, workshopId })
  if (!parcel) return null
  const contents = contentsOf(parcel)
  const order = contents[0]?.line.order
  if (!order || !parcel.address) throw new Error(`the parcel ${parcelId} has no order or address`)
  const workshop = await Workshop.findByPk(workshopId, { rejectOnEmpty: true })
  const kinds = await Unit.findAll({
    where: { runId: order.runId },
    attributes: ['offerKind'],
    group: ['offerKind'],
  })
  const batch =
    parcel.batchId === null
      ? null
      : await PackBatch.findOne({
          where: { id: parcel.batchId, closedAt: null },
          include: [{ model: Person, as: 'packer', attributes: ['name'] }],
        })
  const isMine = actor.kind === 'person' && batch?.packerPersonId === actor.personId
  const isShown = isAddressShown({ deliveredAt: parcel.deliveredAt, now })
  const to = formatAddress(parcel.address.facts(), { script: 'latin', from: workshop.country })
  const own = formatAddress(parcel.address.facts(), { script: 'own', from: workshop.country })
  return {
    parcel: parcel.id,
    number: parcel.number,
    state: parcel.state,
    order: order.id,
    orderNumber: String(order.number),
    ...((await listSiblingParcels([parcel.id])).get(parcel.id) ?? { nth: 1, of: 1 }),
    stop: await stopOf(parcel, order, contents, batch !== null && !isMine),
    otherPacker: batch !== null && !isMine ? (batch.packer?.name ?? '') : null,
    batch: batch && { id: batch.id, name: batch.name },
    onHoldReason: parcel.onHoldReason,
    country: parcel.address.country,
    to: isShown ? to : [],
    toOwnScript: !isShown || own.join('\n') === to.join('\n') ? null : own,
    lines: contents.map(({ line, quantity, serials }) => ({
      line: line.id,
      module: order.run?.module?.name ?? '',
      offer: line.offerKind,
      quantity,
      choices: line.choices.map(writtenChoice),
      serials,
      hasUnits: kinds.some(({ offerKind }) => offerKind === line.offerKind),
    })),
    ...weightOf(contents),
    grams: parcel.grams,
    sizeMm:
      parcel.lengthMm !== null && parcel.widthMm !== null && parcel.heightMm !== null
        ? [parcel.lengthMm, parcel.widthMm, parcel.heightMm]
        : null,
    services: await servicesTo(workshopId, parcel.address.country),
    quotedService: order.postageQuote?.serviceName ?? null,
    service: parcel.serviceName,
    tracking: parcel.tracking,
    trackingKind: parcel.trackingKind,
    handedOverAt: parcel.handedOverAt?.toISOString() ?? null,
    claimByOn: parcel.claimByOn,
    timeZone: workshop.timeZone,
  }
}

type Contents = ReturnType<typeof contentsOf>

/** Only what still can go out may be stopped. */
async function stopOf(
  parcel: Parcel,
  order: Order,
  contents: Contents,
  inOtherBatch: boolean,
): Promise<string | null> {
  if (parcel.handedOverAt !== null) return null
  if (parcel.state === 'discarded') return 'parcel_discarded'
  const offerId = contents.map(({ line }) => line.runOffer!.offerId)
  const paused = await Destination.count({ where: { offerId, country: order.country, state: 'paused' } })
  const may = mayGoOut({
    order: order.state,
    disputed: order.disputedAt !== null,
    destinationPaused: paused > 0,
    onHold: parcel.onHoldReason !== null,
    labelVoid: parcel.labelVoidAt !== null,
    inOtherBatch,
    isReplacement: parcel.problemId !== null,
  })
  return may.ok ? null : may.reason
}

function weightOf(
  contents: Contents,
): Pick<ParcelPage, 'expectedGrams' | 'toleranceGrams' | 'noticesLightest'> {
  const pieces = contents.map(({ line, quantity }) => ({
    grams: line.runOffer!.offer!.packedWeightG,
    quantity,
  }))
  if (pieces.some(({ grams }) => grams === null))
    return { expectedGrams: null, toleranceGrams: null, noticesLightest: false }
  const expectedGrams = pieces.reduce((sum, { grams, quantity }) => sum + grams! * quantity, 0)
  const lightestGrams = Math.min(...pieces.map(({ grams }) => grams!))
  const { toleranceGrams, noticesLightest } = weightCheck({
    expectedGrams,
    grams: expectedGrams,
    lightestGrams,
  })
  return { expectedGrams, toleranceGrams, noticesLightest }
}

async function servicesTo(workshopId: string, country: string): Promise<ParcelPage['services']> {
  const zones = await PostageZone.findAll({
    where: { workshopId },
    include: [{ model: PostageService, as: 'services', where: { endedAt: null }, required: false }],
    order: [
      ['position', 'ASC'],
      [{ model: PostageService, as: 'services' }, 'position', 'ASC'],
    ],
  })
  const named = zones.filter((zone) => zone.countries.includes(country))
  const own = named.length > 0 ? named : zones.filter((zone) => zone.countries.includes('*'))
  return own
    .flatMap((zone) => zone.services ?? [])
    .map(({ name, maxGrams, tracked }) => ({ name, maxGrams, tracked }))
}
