import { randomUUID } from 'node:crypto'
import { expect } from 'vitest'
import { minor } from '@/lib/core/brand'
import type { Result } from '@/lib/core/result'
import { sequelize } from '@/lib/db/sequelize'
import { payments } from '@/lib/gateways/payments'
import { finishOnboarding } from '@/lib/gateways/payments/fake/onboarding'
import { payAsCustomer } from '@/lib/gateways/payments/fake/pay-as-customer'
import type { Purpose } from '@/lib/gateways/payments/types'

export const CARD = {
  pays: '4242 4242 4242 4242',
  paysAtOnce: '4000 0000 0000 0077',
  tooLittle: '4000 0000 0000 9995',
  asksOnce: '4000 0025 0000 3155',
  asksAlways: '4000 0027 6000 3184',
  refusedLater: '4000 0000 0000 0341',
  disputed: '4000 0000 0000 0259',
  refundLater: '4000 0000 0000 7726',
  refundFails: '4000 0000 0000 5126',
} as const

export function valueOf<T, R extends string>(result: Result<T, R>): T {
  if (!result.ok) throw new Error(`refused because ${result.reason}`)
  return result.value
}

export function reasonOf<T, R extends string>(result: Result<T, R>): R {
  if (result.ok) throw new Error('was not refused')
  return result.reason
}

export const newKey = (): string => randomUUID()

/** Business time as the fake sees it. */
export async function businessNow(): Promise<Date> {
  const [rows] = await sequelize.query('select offset_ms from clock_offset')
  return new Date(
    Date.now() + Number((rows[0] as { offset_ms: string | number } | undefined)?.offset_ms ?? 0),
  )
}

export async function advanceHours(hours: number): Promise<void> {
  const [, touched] = await sequelize.query(
    `update clock_offset set offset_ms = offset_ms + ${hours * 3_600_000}`,
  )
  expect(touched).toMatchObject({ rowCount: 1 })
}

export async function openAccount(currency = 'EUR'): Promise<string> {
  const made = await payments().createAccount({
    key: newKey(),
    workshopId: randomUUID(),
    country: 'DE',
    currency,
    email: 'owner@workshop.example',
    name: 'Test Workshop',
  })
  const { account } = valueOf(made)
  await finishOnboarding(account)
  return account
}

export async function newBuyer(account: string): Promise<string> {
  const personId = randomUUID()
  const made = await payments().ensureCustomer({
    account,
    key: newKey(),
    personId,
    email: `${personId}@buyer.example`,
  })
  return valueOf(made).customer
}

type Order = {
  account: string
  customer: string
  amount?: number
  currency?: string
  purpose?: Purpose
  saveCard?: boolean
}

/** What a service would hand in for a deposit. */
export async function checkoutArgs(order: Order) {
  const { account, customer, amount = 2500, currency = 'EUR', purpose = 'deposit', saveCard = true } = order
  return {
    account,
    customer,
    currency,
    purpose,
    saveCard,
    amount: minor(amount),
    key: newKey(),
    orderId: randomUUID(),
    attemptId: randomUUID(),
    description: 'Deposit for order 1',
    successUrl: 'http://localhost:3000/account/orders/1?session={CHECKOUT_SESSION_ID}',
    cancelUrl: 'http://localhost:3000/account/orders/1',
    expiresAt: new Date((await businessNow()).getTime() + 31 * 60_000),
  }
}

/** A deposit paid with a card; the payment's id and the method kept for the balance. */
export async function paidDeposit(order: Order, card: string = CARD.pays) {
  const args = await checkoutArgs(order)
  const session = valueOf(await payments().createCheckout(args))
  const paid = await payAsCustomer({ payUrl: session.url, card })
  expect(paid).toMatchObject({ outcome: 'captured', sessionId: session.sessionId, attemptId: args.attemptId })
  const payment = valueOf(
    await payments().getPayment({ account: order.account, payment: String(paid.payment) }),
  )
  return {
    ...args,
    sessionId: session.sessionId,
    payment: payment.payment,
    method: String(payment.method),
    facts: payment,
  }
}

/** A balance asked for off session. */
export function chargeArgs(order: {
  account: string
  customer: string
  method: string
  amount?: number
  currency?: string
}) {
  const { account, customer, method, amount = 16_400, currency = 'EUR' } = order
  return {
    account,
    customer,
    method,
    currency,
    amount: minor(amount),
    key: newKey(),
    orderId: randomUUID(),
    attemptId: randomUUID(),
    purpose: 'balance' as const,
    description: 'Balance of order 1',
  }
}
