import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { handOver } from '@/lib/services/_steps/hand-over'
import { Order, OrderLine, Parcel, ParcelLine } from '@/models'

/**
 * Hands every packed parcel of a batch over by the service its buyer was quoted. One that cannot go stays packed, with its
 * reason; the others go all the same.
 * Refuses: forbidden. Locks: run, order, parcel of one at a time, a transaction each. Writes: as handing one over. Repeat:
 * safe; what is handed over is not packed any more.
 */
export async function handOverPacked(cmd: { actor: Actor; workshopId: string; batchId: string; now: Date }) {
  const { actor, workshopId, batchId, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'parcel:hand_over', { workshopId })) return refuse('forbidden')
  const parcels = await Parcel.findAll({
    where: { workshopId, batchId, state: 'packed' },
    include: [{ model: ParcelLine, as: 'lines', include: [orderLine] }],
    order: [['number', 'ASC']],
  })
  const left: { parcel: number; reason: string }[] = []
  let handedOver = 0
  for (const parcel of parcels) {
    const quoted = parcel.lines?.[0]?.orderLine?.order?.postageQuote?.serviceName
    const gone = quoted
      ? await inTransaction((tx) =>
          handOver(tx, { actor, workshopId, parcelId: parcel.id, input: { service: quoted }, now }),
        )
      : refuse('no_service')
    if (gone.ok) handedOver += 1
    else left.push({ parcel: parcel.number, reason: gone.reason })
  }
  return ok({ handedOver, left })
}

const orderLine = {
  model: OrderLine,
  as: 'orderLine',
  include: [{ model: Order, as: 'order', attributes: ['postageQuote'] }],
}
