import { beforeAll, describe, expect, test } from 'vitest'
import { payments } from '@/lib/gateways/payments'
import { payAsCustomer } from '@/lib/gateways/payments/fake/pay-as-customer'
import { CARD, chargeArgs, newBuyer, newKey, openAccount, paidDeposit, reasonOf, valueOf } from './support'

const RETURN_URL = 'http://localhost:3000/account/orders/1?from=bank'
let account: string
let customer: string
beforeAll(async () => {
  account = await openAccount()
  customer = await newBuyer(account)
})

async function charge(card: string) {
  const { method } = await paidDeposit({ account, customer }, card)
  const args = chargeArgs({ account, customer, method })
  return { args, outcome: valueOf(await payments().chargeSavedCard(args)) }
}

async function asked() {
  const { args, outcome } = await charge(CARD.asksAlways)
  expect(outcome.state).toBe('needs_customer')
  return { args, payment: outcome.payment.payment }
}

const finish = (payment: string) =>
  payments().finishPayment({ account, key: newKey(), payment, returnUrl: RETURN_URL })

describe('charging a saved card', () => {
  test('captures, and tells fee and purpose', async () => {
    const { args, outcome } = await charge(CARD.pays)
    expect(outcome).toMatchObject({
      state: 'captured',
      payment: {
        capturedAmount: 16_400,
        fee: 246 + 25,
        about: { attemptId: args.attemptId, purpose: 'balance' },
      },
    })
  })

  test('a card saved with the bank’s confirmation is charged later without it', async () => {
    expect((await charge(CARD.asksOnce)).outcome.state).toBe('captured')
  })

  test('a card that is refused later says so in our words and the provider’s', async () => {
    const { outcome } = await charge(CARD.refusedLater)
    expect(outcome).toMatchObject({
      state: 'failed',
      failure: { code: 'declined', providerCode: 'generic_decline', words: 'Your card was declined.' },
      payment: { state: 'failed', capturedAmount: 0 },
    })
  })

  test('a method of another customer, and one that was not saved, are refused', async () => {
    const { method } = await paidDeposit({ account, customer })
    const other = await newBuyer(account)
    expect(reasonOf(await payments().chargeSavedCard(chargeArgs({ account, customer: other, method })))).toBe(
      'invalid',
    )
    const loose = await paidDeposit({ account, customer, saveCard: false })
    const args = chargeArgs({ account, customer, method: loose.method })
    expect(reasonOf(await payments().chargeSavedCard(args))).toBe('invalid')
  })
})

describe('where the bank wants the buyer', () => {
  test('the link finishes the very same payment and leads back', async () => {
    const { payment } = await asked()
    const go = valueOf(await finish(payment))
    if (go.state !== 'go') throw new Error(`expected a link, got ${go.state}`)
    expect(go.payment).toMatchObject({ payment, state: 'needs_customer' })
    expect(await payAsCustomer({ payUrl: go.url, card: CARD.asksAlways })).toMatchObject({
      outcome: 'captured',
      payment,
    })
    expect(valueOf(await payments().getPayment({ account, payment })).state).toBe('captured')
    // A second press, or an old link, changes nothing.
    expect(valueOf(await finish(payment)).state).toBe('captured')
    expect(await payAsCustomer({ payUrl: go.url, card: CARD.asksAlways })).toMatchObject({
      outcome: 'captured',
      payment,
    })
  })

  test('refused at the bank it can be tried again', async () => {
    const { payment } = await asked()
    const go = valueOf(await finish(payment))
    if (go.state !== 'go') throw new Error(`expected a link, got ${go.state}`)
    expect(await payAsCustomer({ payUrl: go.url, card: CARD.tooLittle })).toMatchObject({
      outcome: 'failed',
      payment,
    })
    const facts = valueOf(await payments().getPayment({ account, payment }))
    expect(facts).toMatchObject({ state: 'failed', failure: { code: 'authentication_failed' } })
    expect(valueOf(await finish(payment)).state).toBe('go')
  })

  test('cancelled for another card, it can never be captured any more', async () => {
    const { payment } = await asked()
    const go = valueOf(await finish(payment))
    const cancelled = valueOf(await payments().cancelPayment({ account, key: newKey(), payment }))
    expect(cancelled.state).toBe('cancelled')
    if (go.state === 'go') {
      expect(await payAsCustomer({ payUrl: go.url, card: CARD.asksAlways })).toMatchObject({
        outcome: 'failed',
      })
    }
    expect(reasonOf(await finish(payment))).toBe('wrong_state')
    expect(valueOf(await payments().cancelPayment({ account, key: newKey(), payment })).state).toBe(
      'cancelled',
    )
  })

  test('cancelling a captured payment answers that it was too late', async () => {
    const { outcome } = await charge(CARD.pays)
    const { payment } = outcome.payment
    expect(valueOf(await payments().cancelPayment({ account, key: newKey(), payment })).state).toBe(
      'captured',
    )
  })
})
