import type { CreationAttributes } from 'sequelize'
import { Counter, type Order, type OrderLine, Parcel, ParcelLine, type Run, Unit } from '@/models'
import { NOW, serial } from './base'

/** A built unit of a run that passed its test plan. */
export async function makeUnit(run: Run, over: Partial<CreationAttributes<Unit>> = {}) {
  return Unit.create({
    workshopId: run.workshopId,
    revisionId: run.revisionId,
    runId: run.id,
    serial: `A-${String(serial()).padStart(4, '0')}`,
    state: 'passed',
    startedAt: NOW,
    passedAt: NOW,
    ...over,
  })
}

/** An open parcel with every line of a paid order. */
export async function makeParcel(
  order: Order,
  lines: OrderLine[],
  over: Partial<CreationAttributes<Parcel>> = {},
) {
  const { workshopId } = order
  if (!order.addressId) throw new Error('an order without an address is not posted')
  const where = { workshopId, series: 'parcel' as const }
  const [counter] = await Counter.findOrCreate({ where, defaults: where })
  await counter.increment('last')
  await counter.reload()
  const parcel = await Parcel.create({
    workshopId,
    number: counter.last,
    runId: order.runId,
    personId: order.personId,
    addressId: order.addressId,
    currency: order.currency,
    openedAt: NOW,
    ...over,
  })
  const parcelLines = await ParcelLine.bulkCreate(
    lines.map((line) => ({ workshopId, parcelId: parcel.id, orderLineId: line.id, quantity: line.quantity })),
  )
  return { parcel, parcelLines }
}
