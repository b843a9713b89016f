import { beforeAll, describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { payments } from '@/lib/gateways/payments'
import { payAsCustomer } from '@/lib/gateways/payments/fake/pay-as-customer'
import {
  advanceHours,
  businessNow,
  CARD,
  checkoutArgs,
  newBuyer,
  newKey,
  openAccount,
  paidDeposit,
  reasonOf,
  valueOf,
} from './support'

let account: string
let customer: string
beforeAll(async () => {
  account = await openAccount()
  customer = await newBuyer(account)
})

const start = async (change: object = {}) => {
  const args = { ...(await checkoutArgs({ account, customer })), ...change }
  return { args, made: await payments().createCheckout(args) }
}

describe('a card session', () => {
  test('is open, can be paid once, and tells payment, card, method, purpose and fee', async () => {
    const { args, made } = await start()
    const { sessionId, url, expiresAt } = valueOf(made)
    expect(new URL(url).origin).toBe('http://127.0.0.1:3999')
    expect(Math.abs(expiresAt.getTime() - args.expiresAt.getTime())).toBeLessThan(1000)
    const open = valueOf(await payments().getCheckout({ account, sessionId }))
    expect(open).toMatchObject({ state: 'open', url, amount: 2500, currency: 'EUR', payment: null })

    expect(await payAsCustomer({ payUrl: url, card: CARD.pays })).toMatchObject({ outcome: 'captured' })
    const paid = valueOf(await payments().getCheckout({ account, sessionId }))
    const { orderId, attemptId, purpose } = args
    expect(paid).toMatchObject({ state: 'complete', url: null, about: { orderId, attemptId, purpose } })
    expect(paid.payment).toMatchObject({
      state: 'captured',
      capturedAmount: 2500,
      currency: 'EUR',
      customer,
      card: { brand: 'visa', last4: '4242' },
      about: { orderId, attemptId, purpose },
      refundedAmount: 0,
      // 1.5 % of 25.00 and 0.25: 37.5 cents half up, plus 25 (the fake's own price list).
      fee: 63,
      feeCurrency: 'EUR',
    })
    expect(await payAsCustomer({ payUrl: url, card: CARD.pays })).toMatchObject({ outcome: 'captured' })
    expect(valueOf(await payments().balance({ account }))).toMatchObject({ pending: [{ amount: 2500 - 63 }] })
  })

  test('a refused card leaves it open; another card pays the same payment', async () => {
    const { made } = await start()
    const { url, sessionId } = valueOf(made)
    const first = await payAsCustomer({ payUrl: url, card: CARD.tooLittle })
    expect(first).toMatchObject({ outcome: 'failed', words: 'Your card has insufficient funds.' })
    const between = valueOf(await payments().getCheckout({ account, sessionId }))
    expect(between).toMatchObject({
      state: 'open',
      payment: { state: 'failed', failure: { code: 'insufficient_funds' } },
    })
    const second = await payAsCustomer({ payUrl: url, card: CARD.pays })
    expect(second).toMatchObject({ outcome: 'captured', payment: first.payment })
  })

  test('the card is kept for the balance only where the buyer was asked', async () => {
    const kept = await paidDeposit({ account, customer })
    const saved = await payments().getMethod({ account, customer, method: kept.method })
    expect(valueOf(saved)).toEqual({ brand: 'visa', last4: '4242', expires: '2034-12' })
    const loose = await paidDeposit({ account, customer, saveCard: false })
    expect(reasonOf(await payments().getMethod({ account, customer, method: loose.method }))).toBe(
      'not_found',
    )
  })

  test('lasts 30 minutes to 24 hours', async () => {
    const now = (await businessNow()).getTime()
    for (const [minutes, reason] of [
      [29, 'invalid'],
      [24 * 60 + 5, 'invalid'],
    ] as const) {
      const { made } = await start({ expiresAt: new Date(now + minutes * 60_000) })
      expect(reasonOf(made)).toBe(reason)
    }
    for (const minutes of [31, 23 * 60]) {
      expect((await start({ expiresAt: new Date(now + minutes * 60_000) })).made.ok).toBe(true)
    }
  })

  test('ended by us it can never be paid; ended after payment it says complete', async () => {
    const { made } = await start()
    const { url, sessionId } = valueOf(made)
    const ended = await payments().expireCheckout({ account, key: newKey(), sessionId })
    expect(valueOf(ended)).toMatchObject({ state: 'expired', url: null })
    expect(valueOf(await payments().expireCheckout({ account, key: newKey(), sessionId }))).toMatchObject({
      state: 'expired',
    })
    expect(await payAsCustomer({ payUrl: url, card: CARD.pays })).toMatchObject({ outcome: 'failed' })

    const paid = await paidDeposit({ account, customer })
    const late = await payments().expireCheckout({ account, key: newKey(), sessionId: paid.sessionId })
    expect(valueOf(late)).toMatchObject({ state: 'complete', payment: { state: 'captured' } })
  })

  test('ended after a refused card, its payment is cancelled for good', async () => {
    const { made } = await start()
    const { url, sessionId } = valueOf(made)
    await payAsCustomer({ payUrl: url, card: CARD.tooLittle })
    const ended = await payments().expireCheckout({ account, key: newKey(), sessionId })
    expect(valueOf(ended)).toMatchObject({ state: 'expired', payment: { state: 'cancelled' } })
  })

  test('amounts the provider cannot charge are refused before it is asked', async () => {
    expect(reasonOf((await start({ amount: minor(49) })).made)).toBe('below_minimum')
    expect(reasonOf((await start({ amount: minor(100_000_000) })).made)).toBe('above_maximum')
    expect(reasonOf((await start({ amount: minor(5125), currency: 'KWD' })).made)).toBe('not_representable')
  })

  test('yen and dinar keep their own decimals on the whole way', async () => {
    const yen = await paidDeposit({ account, customer, amount: 3000, currency: 'JPY' })
    expect(yen.facts).toMatchObject({ amount: 3000, capturedAmount: 3000, currency: 'JPY' })
    const dinar = await paidDeposit({ account, customer, amount: 7500, currency: 'KWD' })
    expect(dinar.facts).toMatchObject({ amount: 7500, capturedAmount: 7500, currency: 'KWD' })
  })

  test('an account before its onboarding, a foreign one and an unknown customer are refused', async () => {
    const fresh = valueOf(
      await payments().createAccount({
        key: newKey(),
        workshopId: 'w',
        country: 'DE',
        currency: 'EUR',
        email: 'o@w.example',
        name: 'W',
      }),
    ).account
    const facts = valueOf(await payments().getAccount({ account: fresh }))
    expect(facts).toMatchObject({ chargesEnabled: false, detailsSubmitted: false, currency: 'EUR' })
    expect(reasonOf((await start({ account: fresh })).made)).toBe('not_allowed')
    expect(reasonOf((await start({ account: 'acct_nobody' })).made)).toBe('not_allowed')
    expect(reasonOf((await start({ customer: 'cus_nobody' })).made)).toBe('not_found')
    const other = await openAccount()
    expect(
      reasonOf(
        await payments().getCheckout({ account: other, sessionId: valueOf((await start()).made).sessionId }),
      ),
    ).toBe('not_found')
  })

  test('expires by business time', async () => {
    const { made } = await start()
    const { url, sessionId } = valueOf(made)
    await advanceHours(0.5)
    expect(valueOf(await payments().getCheckout({ account, sessionId })).state).toBe('open')
    await advanceHours(0.05)
    expect(await payAsCustomer({ payUrl: url, card: CARD.pays })).toMatchObject({ outcome: 'failed' })
    expect(valueOf(await payments().getCheckout({ account, sessionId })).state).toBe('expired')
  })
})

describe('accounts', () => {
  test('payouts are daily at first, manual when asked, and daily again', async () => {
    expect(valueOf(await payments().getAccount({ account }))).toMatchObject({
      chargesEnabled: true,
      payoutSchedule: 'automatic',
    })
    await payments().setManualPayouts({ account, key: newKey() })
    expect(valueOf(await payments().getAccount({ account })).payoutSchedule).toBe('manual')
    await payments().setAutomaticPayouts({ account, key: newKey() })
    expect(valueOf(await payments().getAccount({ account })).payoutSchedule).toBe('automatic')
  })

  test('a person is one customer per account, whatever the key', async () => {
    const person = { account, personId: 'person-1', email: 'one@buyer.example' }
    const first = valueOf(await payments().ensureCustomer({ ...person, key: newKey() }))
    const again = valueOf(await payments().ensureCustomer({ ...person, key: newKey() }))
    const namesake = valueOf(
      await payments().ensureCustomer({ ...person, personId: 'person-2', key: newKey() }),
    )
    expect(again).toEqual(first)
    expect(namesake).not.toEqual(first)
  })
})
