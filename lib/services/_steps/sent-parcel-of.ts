import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { OrderLine, Parcel, ParcelLine } from '@/models'

/** The parcel of an order that was handed over last; null while none was. Locks: nothing. Writes: nothing. */
export async function sentParcelOf(tx: Transaction, orderId: string): Promise<Parcel | null> {
  const lines = await ParcelLine.findAll({
    include: [
      { model: OrderLine, as: 'orderLine', attributes: [], where: { orderId }, required: true },
      { model: Parcel, as: 'parcel', where: { handedOverAt: { [Op.ne]: null } }, required: true },
    ],
    transaction: tx,
  })
  const parcels = lines.map(({ parcel }) => parcel!)
  return parcels.sort((a, b) => b.number - a.number)[0] ?? null
}
