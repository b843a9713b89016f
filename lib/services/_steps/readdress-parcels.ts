import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { type Order, OrderLine, Parcel, ParcelLine } from '@/models'

/**
 * Sends an order's open parcels to the address it has now; a label printed before is void. Packed ones keep theirs: the
 * address of a packed order cannot be changed.
 * The caller has locked the order. Writes: its open parcels. Repeat: safe.
 */
export async function readdressParcels(tx: Transaction, order: Order, now: Date): Promise<void> {
  if (order.addressId === null) return
  const lines = await ParcelLine.findAll({
    attributes: ['parcelId'],
    include: [
      { model: OrderLine, as: 'orderLine', attributes: [], where: { orderId: order.id }, required: true },
    ],
    transaction: tx,
  })
  const where = {
    id: lines.map((line) => line.parcelId),
    state: 'open' as const,
    addressId: { [Op.ne]: order.addressId },
  }
  await Parcel.update(
    { labelVoidAt: now },
    { where: { ...where, printedAt: { [Op.ne]: null } }, transaction: tx },
  )
  await Parcel.update({ addressId: order.addressId }, { where, transaction: tx })
}
