import 'server-only'
import type { InferAttributes, WhereOptions } from 'sequelize'
import {
  Address,
  Module,
  Offer,
  Order,
  OrderLine,
  Parcel,
  ParcelLine,
  Person,
  Revision,
  Run,
  RunOffer,
  Unit,
} from '@/models'

const OFFER_FACTS: (keyof InferAttributes<Offer>)[] = [
  'id',
  'packedWeightG',
  'netWeightG',
  'customsDescription',
  'customsCode',
  'customsOrigin',
  'priceMinor',
]

/** Parcels with their address, lines, units, offers, order, run and module: everything a slip or page names. */
export function findParcels(where: WhereOptions<Parcel>): Promise<Parcel[]> {
  const module = { model: Module, as: 'module', attributes: ['name'] }
  const revision = { model: Revision, as: 'revision', attributes: ['letter'] }
  const run = { model: Run, as: 'run', attributes: ['id', 'number'], include: [module, revision] }
  const order = { model: Order, as: 'order', required: true, include: [run] }
  const offer = { model: Offer, as: 'offer', attributes: OFFER_FACTS }
  const runOffer = {
    model: RunOffer,
    as: 'runOffer',
    attributes: ['id', 'offerId', 'priceMinor'],
    include: [offer],
  }
  const orderLine = { model: OrderLine, as: 'orderLine', required: true, include: [order, runOffer] }
  return Parcel.findAll({
    where,
    include: [
      { model: Address, as: 'address', required: true },
      { model: Person, as: 'person', attributes: ['locale'] },
      // Apart from the rest, so that a parcel of many lines is not repeated with its address for each.
      { model: ParcelLine, as: 'lines', separate: true, include: [orderLine, { model: Unit, as: 'unit' }] },
    ],
    order: [['number', 'ASC']],
  })
}

/** A parcel's lines, one per line of the order, in its order, with the serial numbers of its units. */
export function contentsOf(parcel: Parcel) {
  const found = new Map<string, { line: OrderLine; quantity: number; serials: string[] }>()
  for (const { orderLine, quantity, unit } of parcel.lines ?? []) {
    if (!orderLine) throw new Error(`a line of parcel ${parcel.id} has lost its order`)
    const before = found.get(orderLine.id) ?? { line: orderLine, quantity: 0, serials: [] }
    const serials = unit ? [...before.serials, unit.serial].sort() : before.serials
    found.set(orderLine.id, { line: orderLine, quantity: before.quantity + quantity, serials })
  }
  return [...found.values()].sort((a, b) => a.line.position - b.line.position)
}
