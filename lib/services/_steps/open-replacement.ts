import 'server-only'
import type { Transaction } from 'sequelize'
import { next, PARCEL_MOVES } from '@/lib/core/states/parcel'
import { nextNumber } from '@/lib/services/_steps/next-number'
import { recordMove } from '@/lib/services/_steps/record-move'
import { type Order, Parcel, ParcelLine, type Problem } from '@/models'

/**
 * Opens the parcel that replaces another: the same things once more, to the order's address as it is now.
 * The caller has locked order and problem. Writes: parcel, its lines, audit. Repeat: opens another one.
 */
export async function openReplacement(
  tx: Transaction,
  given: { order: Order; problem: Problem; replaced: Parcel; byPersonId: string; now: Date },
): Promise<Parcel> {
  const { order, problem, replaced, byPersonId, now } = given
  const opened = next(PARCEL_MOVES, null, 'open')
  if (!opened.ok) throw new Error('a parcel cannot be opened')
  const { workshopId } = order
  const parcel = await Parcel.create(
    {
      ...{ workshopId, runId: order.runId, personId: order.personId, currency: order.currency },
      number: await nextNumber(tx, workshopId, 'parcel'),
      addressId: order.addressId ?? replaced.addressId,
      problemId: problem.id,
      state: opened.value,
      expectedGrams: replaced.expectedGrams,
      openedAt: now,
    },
    { transaction: tx },
  )
  const lines = await ParcelLine.findAll({ where: { parcelId: replaced.id }, transaction: tx })
  const quantities = new Map<string, number>()
  for (const { orderLineId, quantity } of lines)
    quantities.set(orderLineId, (quantities.get(orderLineId) ?? 0) + quantity)
  await ParcelLine.bulkCreate(
    [...quantities].map(([orderLineId, quantity]) => ({
      ...{ workshopId, parcelId: parcel.id, orderLineId, quantity },
    })),
    { transaction: tx },
  )
  await recordMove(tx, {
    ...{ workshopId, subjectType: 'parcel', subjectId: parcel.id, at: now, byPersonId },
    ...{ from: null, event: 'open', to: opened.value },
  })
  return parcel
}
