import 'server-only'
import type { PackingSlip, PackingSlips } from '@/lib/contracts/papers'
import { can, type Actor } from '@/lib/core/policy/can'
import { isAddressShown } from '@/lib/core/post/address-shown'
import { slipLanguage } from '@/lib/core/post/slip-language'
import { formatAddress } from '@/lib/core/post/address'
import { contentsOf, findParcels } from '@/lib/queries/packing/find-parcels'
import { getPaperIssue } from '@/lib/queries/packing/get-fulfilment-orders'
import { writtenChoice } from '@/lib/queries/packing/list-pack-queue'
import { listSiblingParcels } from '@/lib/queries/packing/list-sibling-parcels'
import type { Parcel, Workshop } from '@/models'

export type SlipsPaper = Omit<PackingSlips, 'size'> & { usesLetter: boolean }

/**
 * Packing slips of parcels, in the order given; those taken apart are left out. Null for who may not print. Bounded: a
 * statement per table, however many slips.
 */
export async function getPackingSlips(cmd: {
  actor: Actor
  workshopId: string
  parcelIds: readonly string[]
  /** Where a buyer reports a problem with an order. */
  problemUrl: (orderId: string) => string
  now: Date
}): Promise<SlipsPaper | null> {
  const { actor, workshopId, parcelIds, problemUrl, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'paper:print', { workshopId })) return null
  const found = await findParcels({ id: [...parcelIds], workshopId })
  const parcels = parcelIds.flatMap(
    (id) => found.find((parcel) => parcel.id === id && isPrinted(parcel, now)) ?? [],
  )
  const { row: workshop, ...issue } = await getPaperIssue({ actor, workshopId, now })
  const places = await listSiblingParcels(parcelIds)
  return {
    ...issue,
    from: senderOf(workshop),
    slips: parcels.map((parcel) => asSlip(parcel, workshop, places.get(parcel.id), problemUrl)),
  }
}

/** Sender and return address, with the country line: the paper may come back from anywhere. */
export function senderOf(workshop: Workshop): string[] {
  const lines = workshop.postalAddress
    ? formatAddress(workshop.postalAddress, { script: 'latin', from: '' })
    : []
  return lines[0] === workshop.name ? lines : [workshop.name, ...lines]
}

function asSlip(
  parcel: Parcel,
  workshop: Workshop,
  place: PackingSlip['parcel'] | undefined,
  problemUrl: (orderId: string) => string,
): PackingSlip {
  const contents = contentsOf(parcel)
  const order = contents[0]?.line.order
  if (!order || !parcel.address) throw new Error(`the parcel ${parcel.id} has no order or address`)
  const to = formatAddress(parcel.address.facts(), { script: 'latin', from: workshop.country })
  const own = formatAddress(parcel.address.facts(), { script: 'own', from: workshop.country })
  return {
    orderNumber: String(order.number),
    parcel: place ?? { nth: 1, of: 1 },
    isReplacement: parcel.problemId !== null,
    language: slipLanguage({ locale: parcel.person?.locale ?? 'en', country: parcel.address.country }),
    to,
    toOwnScript: own.join('\n') === to.join('\n') ? null : own,
    lines: contents.map(({ line, quantity, serials }) => ({
      module: order.run?.module?.name ?? '',
      offer: line.offerKind,
      quantity,
      choices: line.choices.map(writtenChoice),
      serials,
    })),
    problemUrl: problemUrl(order.id),
  }
}

/** Neither taken apart nor arrived so long ago that its address is no packer's business any more. */
const isPrinted = ({ state, deliveredAt }: Parcel, now: Date) =>
  state !== 'discarded' && isAddressShown({ deliveredAt, now })
