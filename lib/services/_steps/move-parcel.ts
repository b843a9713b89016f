import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, type Result } from '@/lib/core/result'
import { next, PARCEL_MOVES, type ParcelEvent } from '@/lib/core/states/parcel'
import { recordMove } from '@/lib/services/_steps/record-move'
import type { Parcel } from '@/models'

type ParcelColumns = Partial<
  Pick<
    Parcel,
    | 'grams'
    | 'lengthMm'
    | 'widthMm'
    | 'heightMm'
    | 'expectedGrams'
    | 'weightConfirmedAt'
    | 'packedAt'
    | 'packedByPersonId'
    | 'serviceId'
    | 'serviceName'
    | 'tracking'
    | 'trackingKind'
    | 'claimByOn'
    | 'handedOverAt'
    | 'handedOverByPersonId'
    | 'discardedAt'
    | 'deliveredAt'
    | 'lostAt'
    | 'returnedAt'
  >
>

/**
 * Moves a parcel the caller has locked, by the table of its states, with what the new state needs to be known.
 * Refuses: not_allowed. Writes: the parcel and its audit entry. Repeat: refused, the state has changed.
 */
export async function moveParcel(
  tx: Transaction,
  parcel: Parcel,
  event: ParcelEvent,
  by: { now: Date; byPersonId: string | null; change?: ParcelColumns },
): Promise<Result<Parcel, 'not_allowed'>> {
  const from = parcel.state
  const to = next(PARCEL_MOVES, from, event)
  if (!to.ok) return to
  await parcel.update({ ...by.change, state: to.value }, { transaction: tx })
  await recordMove(tx, {
    workshopId: parcel.workshopId,
    subjectType: 'parcel',
    subjectId: parcel.id,
    from,
    event,
    to: to.value,
    byPersonId: by.byPersonId,
    at: by.now,
  })
  return ok(parcel)
}
