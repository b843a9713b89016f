import { beforeAll, describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { payments } from '@/lib/gateways/payments'
import {
  advanceHours,
  CARD,
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
beforeAll(async () => {
  account = await openAccount()
  customer = await newBuyer(account)
})
const window = () => ({ account, from: new Date(0), to: new Date('2100-01-01') })

describe('the same key', () => {
  test('and the same request: the same session, once', async () => {
    const args = await checkoutArgs({ account, customer })
    const [one, two] = await Promise.all([payments().createCheckout(args), payments().createCheckout(args)])
    expect(valueOf(two)).toEqual(valueOf(one))
  })

  test('and another request is refused and changes nothing', async () => {
    const args = await checkoutArgs({ account, customer })
    valueOf(await payments().createCheckout(args))
    expect(reasonOf(await payments().createCheckout({ ...args, amount: minor(2600) }))).toBe('key_reused')
  })

  test('charges a card once, however often it is sent', async () => {
    const { method } = await paidDeposit({ account, customer })
    const args = chargeArgs({ account, customer, method })
    const answers = await Promise.all(Array.from({ length: 5 }, () => payments().chargeSavedCard(args)))
    expect(new Set(answers.map((answer) => valueOf(answer).payment.payment)).size).toBe(1)
    const charges = valueOf(await payments().listCharges(window()))
    expect(charges.filter(({ amount }) => amount === args.amount)).toHaveLength(1)
  })

  test('tells a refusal again instead of trying the card again', async () => {
    const { method } = await paidDeposit({ account, customer }, CARD.refusedLater)
    const args = chargeArgs({ account, customer, method })
    const first = valueOf(await payments().chargeSavedCard(args))
    const again = valueOf(await payments().chargeSavedCard(args))
    expect(again).toEqual(first)
    expect(again.state).toBe('failed')
  })

  test('pays back once', async () => {
    const { payment } = await paidDeposit({ account, customer })
    const args = { account, key: newKey(), payment, amount: minor(1000), currency: 'EUR', refundId: newKey() }
    const first = valueOf(await payments().refund(args))
    expect(valueOf(await payments().refund(args))).toEqual(first)
    expect(valueOf(await payments().getPayment({ account, payment })).refundedAmount).toBe(1000)
  })

  test('of a request refused before it began is still free', async () => {
    const args = await checkoutArgs({ account, customer })
    expect(reasonOf(await payments().createCheckout({ ...args, expiresAt: new Date(0) }))).toBe('invalid')
    expect((await payments().createCheckout(args)).ok).toBe(true)
  })

  test('may be forgotten after a day: then only a look-up protects', async () => {
    const { payment } = await paidDeposit({ account, customer })
    const args = { account, key: newKey(), payment, amount: minor(1000), currency: 'EUR', refundId: newKey() }
    const first = valueOf(await payments().refund(args))
    await advanceHours(25)
    const found = valueOf(await payments().findRefund({ account, payment, refundId: args.refundId }))
    expect(found).toEqual(first)
    expect(valueOf(await payments().refund(args)).id).not.toBe(first.id)
  })
})

describe('looking up what was sent', () => {
  test('finds a session before and after it is paid, and a charged card', async () => {
    const args = await checkoutArgs({ account, customer })
    const { attemptId } = args
    expect(reasonOf(await payments().findAttempt({ account, customer, attemptId }))).toBe('not_found')
    const { sessionId } = valueOf(await payments().createCheckout(args))
    const open = valueOf(await payments().findAttempt({ account, customer, attemptId }))
    expect(open).toMatchObject({ kind: 'checkout', checkout: { sessionId, state: 'open', payment: null } })

    const paid = await paidDeposit({ account, customer })
    const found = valueOf(await payments().findAttempt({ account, customer, attemptId: paid.attemptId }))
    expect(found).toMatchObject({
      kind: 'checkout',
      checkout: { state: 'complete', payment: { state: 'captured', fee: 63 } },
    })

    const charge = chargeArgs({ account, customer, method: paid.method })
    valueOf(await payments().chargeSavedCard(charge))
    const charged = valueOf(await payments().findAttempt({ account, customer, attemptId: charge.attemptId }))
    expect(charged).toMatchObject({ kind: 'payment', payment: { state: 'captured', fee: 271 } })
  })

  test('a refund that was never sent is not found', async () => {
    const { payment } = await paidDeposit({ account, customer })
    expect(reasonOf(await payments().findRefund({ account, payment, refundId: newKey() }))).toBe('not_found')
  })
})
