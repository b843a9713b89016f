import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { next, PARCEL_MOVES } from '@/lib/core/states/parcel'
import { linesToPack } from '@/lib/services/_steps/lines-to-pack'
import { nextNumber } from '@/lib/services/_steps/next-number'
import { recordMove } from '@/lib/services/_steps/record-move'
import { unitsReady } from '@/lib/services/_steps/units-ready'
import { Destination, type Order, Parcel, ParcelLine } from '@/models'

/**
 * Puts a paid order into the pack queue: one open parcel with everything of it that is in no parcel yet. Null, and nothing
 * written, while it must not be packed: not paid, disputed, without an address, its destination paused for one of its
 * offers, its units recorded but not passed, or nothing left to pack.
 * The caller has locked the order. Writes: parcel, its lines, audit. Repeat: safe; there is nothing left to pack.
 */
export async function openParcelForOrder(tx: Transaction, order: Order, now: Date): Promise<Parcel | null> {
  if (order.state !== 'paid' || order.disputedAt !== null || order.addressId === null) return null
  const lines = await linesToPack(tx, order.id)
  if (lines.length === 0) return null
  const offerIds = lines.map((line) => line.offer.id)
  if ((await pausedFor(tx, order, offerIds)) || !(await unitsReady(tx, order, lines))) return null

  const opened = next(PARCEL_MOVES, null, 'open')
  if (!opened.ok) throw new Error('a parcel cannot be opened')
  const { workshopId } = order
  const parcel = await Parcel.create(
    {
      workshopId,
      number: await nextNumber(tx, workshopId, 'parcel'),
      runId: order.runId,
      personId: order.personId,
      addressId: order.addressId,
      state: opened.value,
      expectedGrams: expectedGramsOf(lines),
      currency: order.currency,
      openedAt: now,
    },
    { transaction: tx },
  )
  await ParcelLine.bulkCreate(
    lines.map(({ line, quantity }) => ({ workshopId, parcelId: parcel.id, orderLineId: line.id, quantity })),
    { transaction: tx },
  )
  await recordMove(tx, {
    workshopId,
    subjectType: 'parcel',
    subjectId: parcel.id,
    from: null,
    event: 'open',
    to: opened.value,
    byPersonId: null,
    at: now,
  })
  return parcel
}

async function pausedFor(tx: Transaction, order: Order, offerIds: string[]): Promise<boolean> {
  const paused = await Destination.count({
    where: { offerId: { [Op.in]: offerIds }, country: order.country, state: 'paused' },
    transaction: tx,
  })
  return paused > 0
}

/** Null as soon as one of the offers was never weighed: half a sum would only mislead the scale. */
function expectedGramsOf(lines: Awaited<ReturnType<typeof linesToPack>>): number | null {
  let sum = 0
  for (const { quantity, offer } of lines) {
    if (offer.packedWeightG === null) return null
    sum += quantity * offer.packedWeightG
  }
  return sum
}
