import { minor } from '@/lib/core/brand'
import type { CreationAttributes } from 'sequelize'
import type { AttemptState } from '@/lib/core/states/attempt'
import { Invoice, type Order, PaymentAttempt, Refund, Workshop } from '@/models'
import { hoursAfter, NOW, serial } from './base'
import { hashOf } from './sign-up'

const ENDED: readonly AttemptState[] = ['captured', 'failed', 'abandoned']

/** An attempt to be paid the deposit, captured unless said otherwise. */
export async function makeAttempt(order: Order, over: Partial<CreationAttributes<PaymentAttempt>> = {}) {
  const workshop = await Workshop.findByPk(order.workshopId, { rejectOnEmpty: true })
  const purpose = over.purpose ?? 'deposit'
  const sequence =
    over.sequence ?? (await PaymentAttempt.count({ where: { orderId: order.id, purpose } })) + 1
  const state = over.state ?? 'captured'
  const isAnswered = state !== 'requested'
  const number = serial()
  return PaymentAttempt.create({
    workshopId: order.workshopId,
    orderId: order.id,
    purpose,
    sequence,
    method: purpose === 'balance' ? 'saved_card' : 'checkout',
    amountMinor: purpose === 'balance' ? order.balanceMinor : order.depositMinor,
    currency: order.currency,
    idempotencyKey: `${purpose}:${order.id}:${sequence}`,
    paramsHash: hashOf(`${purpose}:${order.id}`),
    params: {},
    providerAccountId: workshop.providerAccountId ?? 'acct_none',
    providerId: isAnswered ? `pi_${number}` : null,
    providerSessionId: isAnswered && purpose !== 'balance' ? `cs_${number}` : null,
    chargeId: state === 'captured' ? `ch_${number}` : null,
    payUrl: isAnswered && purpose !== 'balance' ? `https://pay.example/${number}` : null,
    sessionExpiresAt: purpose === 'balance' ? null : hoursAfter(NOW, 31 / 60),
    state,
    requestedAt: NOW,
    sentAt: isAnswered ? NOW : null,
    endedAt: ENDED.includes(state) ? NOW : null,
    ...over,
  })
}

/** The whole of a captured attempt going back. */
export async function makeRefund(attempt: PaymentAttempt, over: Partial<CreationAttributes<Refund>> = {}) {
  const sequence = over.sequence ?? (await Refund.count({ where: { attemptId: attempt.id } })) + 1
  return Refund.create({
    workshopId: attempt.workshopId,
    attemptId: attempt.id,
    orderId: attempt.orderId,
    sequence,
    amountMinor: attempt.amountMinor,
    currency: attempt.currency,
    cause: 'cancelled',
    idempotencyKey: `refund:${attempt.id}:${sequence}`,
    requestedAt: NOW,
    ...over,
  })
}

/** The numbered paper of a deposit. */
export function makeInvoice(order: Order, over: Partial<CreationAttributes<Invoice>> = {}) {
  const { workshopId, id: orderId, addressId, currency, depositMinor } = order
  const taxMinor = minor(0)
  return Invoice.create({
    workshopId,
    orderId,
    addressId,
    currency,
    kind: 'prepayment',
    series: 'invoice',
    number: serial(),
    netMinor: depositMinor,
    taxMinor,
    grossMinor: depositMinor,
    taxCountry: 'DE',
    lines: [
      {
        text: 'Deposit',
        quantity: 1,
        unitMinor: depositMinor,
        grossMinor: depositMinor,
        taxMinor,
        taxBasisPoints: 0,
      },
    ],
    issuedOn: '2027-03-01',
    issuedAt: NOW,
    ...over,
  })
}
