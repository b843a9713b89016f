import 'server-only'
import type { Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import { paymentDescription } from '@/lib/messages/payments'
import { paths } from '@/lib/paths'
import { requestAttempt } from '@/lib/services/_steps/request-attempt'
import { isChange, type Due } from '@/lib/services/_steps/due-of'
import type { Module, Order, PaymentAttempt, Workshop } from '@/models'

/** The least the provider allows is 30 minutes; a minute more, so that a slow request is not too late. */
const LEAST_MINUTES = 31

/** Until when someone who begins to pay now may pay. */
export const sessionEnd = (workshop: Workshop, now: Date) =>
  new Date(now.getTime() + Math.max(LEAST_MINUTES, workshop.holdMinutes) * 60_000)

/**
 * Act 1 of a payment on the card page. The deposit's page also asks the buyer to let the card be charged later.
 * The caller has locked the order. Locks, writes: as `requestAttempt`.
 */
export async function requestCardSession(
  tx: Transaction,
  asked: {
    order: Order
    due: Due
    workshop: Workshop
    module: Module
    customer: string
    now: Date
  },
): Promise<PaymentAttempt> {
  const { order, due, workshop, module, customer, now } = asked
  const account = workshop.providerAccountId
  if (account === null) throw new Error(`workshop ${workshop.id} has no payment account`)
  const { purpose, amountMinor } = due
  const page = `${env().BASE_URL}${paths.accountOrder(order.id)}`
  return requestAttempt(tx, {
    order,
    purpose,
    amountMinor,
    method: 'checkout',
    account,
    now,
    paramsOf: (attemptId) => ({
      account,
      customer,
      orderId: order.id,
      attemptId,
      purpose,
      amount: amountMinor,
      currency: order.currency,
      description: paymentDescription[isChange(purpose) ? 'change' : purpose](module.name, order.number),
      saveCard: purpose === 'deposit',
      successUrl: `${page}?paid=1`,
      cancelUrl: page,
      expiresAt: sessionEnd(workshop, now).toISOString(),
    }),
  })
}
