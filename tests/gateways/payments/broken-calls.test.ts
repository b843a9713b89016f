import { afterEach, beforeAll, describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { payments } from '@/lib/gateways/payments'
import { type Break, breakCalls, callsSoFar } from '@/lib/gateways/payments/fake/break-calls'
import { plantChange, plantLoss, plantTwin } from '@/lib/gateways/payments/fake/plant'
import {
  chargeArgs,
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
let method: string
beforeAll(async () => {
  account = await openAccount()
  customer = await newBuyer(account)
  ;({ method } = await paidDeposit({ account, customer }))
})
afterEach(() => breakCalls(null))

const always = (how: Break) => breakCalls(() => how)
const once = (how: Break) => breakCalls(({ n }) => (n === 1 ? how : null))
const chargedBy = async (attemptId: string) => payments().findAttempt({ account, customer, attemptId })

describe('a broken call', () => {
  test.each(['before', 'after'] as const)(
    'lost once %s it was carried out, the SDK repeats it with the same key',
    async (how) => {
      const args = chargeArgs({ account, customer, method, amount: 777 })
      once(how)
      expect(valueOf(await payments().chargeSavedCard(args)).state).toBe('captured')
      expect(callsSoFar()).toBe(2)
      breakCalls(null)
      expect(valueOf(await chargedBy(args.attemptId))).toMatchObject({
        payment: { state: 'captured', capturedAmount: 777 },
      })
    },
  )

  test.each([
    ['before', 'unknown_outcome', null],
    ['after', 'unknown_outcome', 'captured'],
    ['error_500', 'unknown_outcome', 'captured'],
    ['error_429', 'rate_limited', null],
  ] as const)('broken for good (%s) says %s, and the look-up tells the truth', async (how, reason, state) => {
    const args = chargeArgs({ account, customer, method })
    always(how)
    expect(reasonOf(await payments().chargeSavedCard(args))).toBe(reason)
    breakCalls(null)
    const found = await chargedBy(args.attemptId)
    if (state === null) expect(reasonOf(found)).toBe('not_found')
    else expect(valueOf(found)).toMatchObject({ kind: 'payment', payment: { state } })
  })

  test('answered 500 after it was carried out says 500 again for the same key', async () => {
    const args = chargeArgs({ account, customer, method })
    once('error_500')
    expect(reasonOf(await payments().chargeSavedCard(args))).toBe('unknown_outcome')
    expect(reasonOf(await payments().chargeSavedCard(args))).toBe('unknown_outcome')
    expect(valueOf(await chargedBy(args.attemptId))).toMatchObject({ payment: { state: 'captured' } })
  })

  test('ending a session or a payment asks the object itself when the answer was lost', async () => {
    const { sessionId } = valueOf(await payments().createCheckout(await checkoutArgs({ account, customer })))
    breakCalls(({ method: verb }) => (verb === 'post' ? 'error_500' : null))
    expect(valueOf(await payments().expireCheckout({ account, key: newKey(), sessionId })).state).toBe(
      'expired',
    )
  })

  test('a refund of unknown outcome is found by its row', async () => {
    const { payment } = await paidDeposit({ account, customer })
    const refundId = newKey()
    once('error_500')
    const args = { account, key: newKey(), payment, amount: minor(2500), currency: 'EUR', refundId }
    expect(reasonOf(await payments().refund(args))).toBe('unknown_outcome')
    const found = await payments().findRefund({ account, payment, refundId })
    expect(valueOf(found)).toMatchObject({ state: 'succeeded', amount: 2500, refundId })
  })
})

describe('planted differences', () => {
  test('show in the lists as the provider’s word', async () => {
    const own = await openAccount()
    const buyer = await newBuyer(own)
    for (let i = 0; i < 3; i += 1) await paidDeposit({ account: own, customer: buyer })
    const list = async () =>
      valueOf(await payments().listCharges({ account: own, from: new Date(0), to: new Date('2100-01-01') }))
    const [first, second] = await list()
    await plantChange(String(first?.id), { amount_captured: 2400 })
    await plantLoss(String(second?.id))
    const twin = await plantTwin(String(first?.id), 'charge', 1)
    const after = await list()
    expect(after.map(({ amount }) => amount)).toEqual([2400, 2500, 2400])
    expect(after.at(-1)?.id).toBe(twin)
  })
})
