import { beforeAll, describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { payments } from '@/lib/gateways/payments'
import { addFunds, disputePayment, setBankDebits } from '@/lib/gateways/payments/fake/controls'
import { passTime } from '@/lib/gateways/payments/fake/pass-time'
import { advanceHours, CARD, newBuyer, newKey, openAccount, paidDeposit, reasonOf, valueOf } from './support'

let account: string
let customer: string
beforeAll(async () => {
  account = await openAccount()
  customer = await newBuyer(account)
})

const refund = (payment: string, amount: number, on = account, currency = 'EUR') =>
  payments().refund({
    account: on,
    key: newKey(),
    payment,
    amount: minor(amount),
    currency,
    refundId: newKey(),
  })
const refundedOf = async (payment: string) =>
  valueOf(await payments().getPayment({ account, payment })).refundedAmount

describe('paying back', () => {
  test('in parts, never above the payment', async () => {
    const { payment } = await paidDeposit({ account, customer })
    expect(valueOf(await refund(payment, 1000))).toMatchObject({ state: 'succeeded', amount: 1000, payment })
    expect(reasonOf(await refund(payment, 1501))).toBe('more_than_charged')
    expect(valueOf(await refund(payment, 1500)).state).toBe('succeeded')
    expect(reasonOf(await refund(payment, 1))).toBe('more_than_charged')
    expect(await refundedOf(payment)).toBe(2500)
  })

  test('a few cents may go back although they could not be charged', async () => {
    const { payment } = await paidDeposit({ account, customer })
    expect(valueOf(await refund(payment, 7))).toMatchObject({ state: 'succeeded', amount: 7 })
  })

  test('two at once for all of it: one happens', async () => {
    const { payment } = await paidDeposit({ account, customer })
    const both = await Promise.all([refund(payment, 2500), refund(payment, 2500)])
    expect(both.filter(({ ok }) => ok)).toHaveLength(1)
    expect(await refundedOf(payment)).toBe(2500)
  })

  test('an unpaid, an unknown and a disputed payment are refused', async () => {
    expect(reasonOf(await refund('pi_nobody', 100))).toBe('not_found')
    const { payment } = await paidDeposit({ account, customer })
    await disputePayment(payment)
    expect(reasonOf(await refund(payment, 2500))).toBe('wrong_state')
  })

  test('some take a day', async () => {
    const { payment } = await paidDeposit({ account, customer }, CARD.refundLater)
    const { id, state } = valueOf(await refund(payment, 2500))
    expect(state).toBe('pending')
    await advanceHours(25)
    await passTime()
    expect(valueOf(await payments().getRefund({ account, refund: id })).state).toBe('succeeded')
  })

  test('some fail after they succeeded; the money is the account’s again and can be sent once more', async () => {
    const { payment } = await paidDeposit({ account, customer }, CARD.refundFails)
    const { id, state } = valueOf(await refund(payment, 2500))
    expect(state).toBe('succeeded')
    await advanceHours(25)
    await passTime()
    expect(valueOf(await payments().getRefund({ account, refund: id }))).toMatchObject({ state: 'failed' })
    expect(await refundedOf(payment)).toBe(0)
    expect(valueOf(await refund(payment, 2500)).state).toBe('succeeded')
  })
})

describe('a balance too small', () => {
  test('keeps the refund waiting until money comes', async () => {
    const poor = await openAccount()
    await setBankDebits(poor, false)
    const { payment, facts } = await paidDeposit({ account: poor, customer: await newBuyer(poor) })
    const waiting = valueOf(await refund(payment, 2500, poor))
    expect(waiting).toMatchObject({ state: 'pending', failure: 'insufficient_funds' })
    await advanceHours(1)
    await passTime()
    expect(valueOf(await payments().getRefund({ account: poor, refund: waiting.id })).state).toBe('pending')
    // Short by exactly the fee the provider kept.
    await addFunds(poor, Number(facts.fee), 'EUR')
    await advanceHours(1)
    await passTime()
    expect(valueOf(await payments().getRefund({ account: poor, refund: waiting.id })).state).toBe('succeeded')
    const { available, pending } = valueOf(await payments().balance({ account: poor }))
    expect(Number(available[0]?.amount) + Number(pending[0]?.amount)).toBe(0)
  })
})
