import 'server-only'
import type { WhereOptions } from 'sequelize'
import {
  Address,
  AuditEntry,
  Invoice,
  Module,
  Order,
  OrderChange,
  OrderLine,
  Parcel,
  ParcelLine,
  PaymentAttempt,
  Refund,
  Run,
  Workshop,
} from '@/models'

export type FoundOrder = {
  order: Order
  run: Run
  module: Module
  workshop: Workshop
  audit: AuditEntry[]
  parcels: Parcel[]
  /** Place on the waiting list, from 1; null without one. */
  position: number | null
}

/**
 * Orders with everything their pages and lists tell, newest first. A bounded number of statements, however many orders:
 * one per table.
 */
export async function findOrders(where: WhereOptions, limit: number): Promise<FoundOrder[]> {
  const orders = await Order.findAll({
    where,
    limit,
    order: [
      ['placedAt', 'DESC'],
      ['id', 'DESC'],
    ],
    include: [
      { model: Workshop, as: 'workshop', required: true },
      { model: Address, as: 'address' },
      { model: Run, as: 'run', required: true, include: [{ model: Module, as: 'module', required: true }] },
      { model: OrderLine, as: 'lines', separate: true, order: [['position', 'ASC']] },
      { model: PaymentAttempt, as: 'attempts', separate: true, order: [['requestedAt', 'ASC']] },
      // Changes whose difference is not paid yet.
      { model: OrderChange, as: 'changes', separate: true, where: { appliedAt: null, droppedAt: null } },
      { model: Refund, as: 'refunds', separate: true, order: [['requestedAt', 'ASC']] },
      { model: Invoice, as: 'invoices', separate: true, order: [['issuedAt', 'ASC']] },
    ],
  })
  const ids = orders.map(({ id }) => id)
  const audit = await AuditEntry.findAll({
    where: { subjectType: 'order', subjectId: ids },
    order: [
      ['at', 'ASC'],
      ['id', 'ASC'],
    ],
  })
  const parcelLines = await ParcelLine.findAll({
    where: { orderLineId: orders.flatMap((order) => (order.lines ?? []).map(({ id }) => id)) },
    include: [{ model: Parcel, as: 'parcel', required: true }],
  })
  const waiting = await Order.findAll({
    where: {
      runId: orders.filter(({ state }) => state === 'waiting').map(({ runId }) => runId),
      state: 'waiting',
    },
    attributes: ['id', 'runId', 'queueNo'],
  })
  return orders.map((order) => ({
    order,
    run: order.run!,
    module: order.run!.module!,
    workshop: order.workshop!,
    audit: audit.filter(({ subjectId }) => subjectId === order.id),
    parcels: parcelsOf(order, parcelLines),
    position: order.state === 'waiting' ? placeInLine(order, waiting) : null,
  }))
}

function parcelsOf(order: Order, parcelLines: ParcelLine[]): Parcel[] {
  const lines = new Set((order.lines ?? []).map(({ id }) => id))
  const mine = parcelLines.filter(({ orderLineId }) => lines.has(orderLineId)).map(({ parcel }) => parcel!)
  return [...new Map(mine.map((parcel) => [parcel.id, parcel])).values()]
}

function placeInLine(order: Order, waiting: Order[]): number {
  const before = waiting.filter(
    (other) => other.runId === order.runId && (other.queueNo ?? 0) < (order.queueNo ?? 0),
  )
  return before.length + 1
}
