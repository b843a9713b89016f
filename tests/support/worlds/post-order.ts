import { handOverParcel } from '@/lib/services/packing/hand-over-parcel'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { type Order, OrderLine, Parcel, type Person, type Workshop } from '@/models'
import { NOW } from './base'
import { actorOf } from './person'

type World = { owner: Person; workshop: Workshop }

/** Packs everything of a paid order into its open parcel. */
export async function pack({ owner, workshop }: World, order: Order, grams = 420): Promise<void> {
  const lines = await OrderLine.findAll({ where: { orderId: order.id } })
  const packed = await packParcel({
    actor: await actorOf(owner),
    workshopId: workshop.id,
    parcelId: (await parcelOf(order, 'open')).id,
    input: {
      lines: lines.map(({ id, quantity }) => ({ line: id, quantity })),
      grams,
      weightConfirmed: true,
    },
    now: NOW,
  })
  if (!packed.ok) throw new Error(`not packed: ${packed.reason}`)
  await order.reload()
}

/** Hands its packed parcel to the post. */
export async function handOver({ owner, workshop }: World, order: Order): Promise<void> {
  const gone = await handOverParcel({
    actor: await actorOf(owner),
    workshopId: workshop.id,
    parcelId: (await parcelOf(order, 'packed')).id,
    input: { service: 'Parcel' },
    now: NOW,
  })
  if (!gone.ok) throw new Error(`not handed over: ${gone.reason}`)
  await order.reload()
}

const parcelOf = ({ personId }: Order, state: 'open' | 'packed') =>
  Parcel.findOne({ where: { personId, state }, rejectOnEmpty: true })
