import 'server-only'
import { Op, type Transaction } from 'sequelize'
import type { AddressInput } from '@/lib/contracts/address'
import { refuseFields, type FieldRefusal } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import type { OrderState } from '@/lib/core/states/order'
import { inTransaction } from '@/lib/db/in-transaction'
import { addressErrors } from '@/lib/queries/orders/address-errors'
import { addAddress } from '@/lib/services/_steps/add-address'
import { addressFingerprint } from '@/lib/services/_steps/address-fingerprint'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { reissuePrepayments } from '@/lib/services/_steps/prepayment-invoice'
import { recordMove } from '@/lib/services/_steps/record-move'
import { requoteOrder } from '@/lib/services/_steps/requote-order'
import { type Address, Order, OrderLine, Parcel, ParcelLine, type Run } from '@/models'

const UNTIL_PACKING: readonly OrderState[] = [
  'waiting',
  'awaiting_deposit',
  'reserved',
  'balance_due',
  'paid',
]
const LIVE: OrderState[] = ['waiting', 'awaiting_deposit', 'reserved', 'balance_due', 'paid', 'packed']

/**
 * Changes where an order goes, until it is packed. Another country is quoted again: postage and tax change and with them
 * the balance, as long as that has not been paid and no payment of it is under way.
 * Refuses: not_found · packed_already · already_ordered (another live order goes there) · payment_in_flight and
 * country_is_settled (another country, but the balance is being paid or paid) · field mistakes · weights_missing.
 * Locks: run, order. Writes: a new address, the order, its lines, its open parcel, papers of another country's tax, audit. Repeat: safe; the same address
 * again changes nothing that is paid.
 */
export async function setAddress(cmd: {
  actor: Actor
  orderId: string
  address: AddressInput
  now: Date
}): Promise<Result<{ order: string }, string> | FieldRefusal> {
  const { actor, orderId, address } = cmd
  const seen = await Order.findByPk(orderId, { attributes: ['personId', 'workshopId'] })
  if (!seen || actor.kind !== 'person' || !can(actor, 'order:set_address', seen)) return refuse('not_found')
  const errors = addressErrors(address)
  if (Object.keys(errors).length > 0) return refuseFields(errors)
  return inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    if (!locked) return refuse('not_found')
    return change(tx, locked, { ...cmd, byPersonId: actor.personId })
  })
}

async function change(
  tx: Transaction,
  { run, order }: { run: Run; order: Order },
  by: { address: AddressInput; now: Date; byPersonId: string },
): Promise<Result<{ order: string }, string> | FieldRefusal> {
  const { address, now } = by
  if (!UNTIL_PACKING.includes(order.state)) return refuse('packed_already')
  const fingerprint = addressFingerprint(address)
  const { workshopId, personId, runId } = order
  const others = { runId, personId, addressFingerprint: fingerprint, state: LIVE, id: { [Op.ne]: order.id } }
  if ((await Order.count({ where: others, transaction: tx })) > 0) return refuse('already_ordered')
  if (address.country !== order.country) {
    const quoted = await requoteOrder(tx, { run, order, address, now })
    if (!quoted.ok) return quoted
  }
  const written = await addAddress(tx, { workshopId, personId, address, now })
  await order.update(
    { addressId: written.id, addressFingerprint: fingerprint, country: address.country },
    { transaction: tx },
  )
  await reissuePrepayments(tx, order, now)
  await redirectParcel(tx, order, written, now)
  await recordMove(tx, {
    workshopId,
    subjectType: 'order',
    subjectId: order.id,
    from: order.state,
    event: 'address_changed',
    to: order.state,
    byPersonId: by.byPersonId,
    at: now,
  })
  return ok({ order: order.id })
}

/** An open parcel goes to the new address; a label printed for the old one is void. */
async function redirectParcel(tx: Transaction, order: Order, address: Address, now: Date): Promise<void> {
  const lines = await OrderLine.findAll({ where: { orderId: order.id }, attributes: ['id'], transaction: tx })
  const parcels = await Parcel.findAll({
    where: { state: 'open' },
    include: [
      { model: ParcelLine, as: 'lines', required: true, where: { orderLineId: lines.map(({ id }) => id) } },
    ],
    transaction: tx,
  })
  for (const parcel of parcels)
    await parcel.update(
      { addressId: address.id, labelVoidAt: parcel.printedAt === null ? null : now },
      { transaction: tx },
    )
}
