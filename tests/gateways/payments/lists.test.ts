import { beforeAll, describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { payments } from '@/lib/gateways/payments'
import { disputePayment } from '@/lib/gateways/payments/fake/controls'
import { passTime } from '@/lib/gateways/payments/fake/pass-time'
import type { BookLine } from '@/lib/gateways/payments/types'
import {
  advanceHours,
  CARD,
  chargeArgs,
  newBuyer,
  newKey,
  openAccount,
  paidDeposit,
  valueOf,
} from './support'

const sum = (lines: readonly BookLine[]) => lines.reduce((total, { amount }) => total + amount, 0)
const always = (account: string) => ({ account, from: new Date(0), to: new Date('2100-01-01') })

async function booksOf(account: string) {
  const window = always(account)
  return {
    charges: valueOf(await payments().listCharges(window)),
    refunds: valueOf(await payments().listRefunds(window)),
    disputes: valueOf(await payments().listDisputes(window)),
    fees: valueOf(await payments().listFees(window)),
    payouts: valueOf(await payments().listPayouts(window)),
  }
}

async function balanceOf(account: string) {
  const { available, pending } = valueOf(await payments().balance({ account }))
  return [...available, ...pending].reduce((total, { amount }) => total + amount, 0)
}

describe('the provider’s own books', () => {
  test('are read to the last page, oldest first, each charge once', async () => {
    const account = await openAccount()
    const customer = await newBuyer(account)
    const { method } = await paidDeposit({ account, customer })
    for (let i = 0; i < 120; i += 1) {
      valueOf(await payments().chargeSavedCard(chargeArgs({ account, customer, method, amount: 1000 + i })))
    }
    const { charges, fees } = await booksOf(account)
    expect(charges.map(({ amount }) => amount)).toEqual([
      2500,
      ...Array.from({ length: 120 }, (_, i) => 1000 + i),
    ])
    expect(new Set(charges.map(({ id }) => id)).size).toBe(121)
    expect(fees).toHaveLength(121)
    expect(new Set(fees.map(({ payment }) => payment)).size).toBe(121)
  })

  test('explain the balance: charges less refunds, disputes, fees and payouts', async () => {
    const account = await openAccount()
    const customer = await newBuyer(account)
    await paidDeposit({ account, customer })
    await paidDeposit({ account, customer }, CARD.paysAtOnce)
    const back = await paidDeposit({ account, customer })
    valueOf(
      await payments().refund({
        account,
        key: newKey(),
        payment: back.payment,
        amount: minor(1200),
        currency: 'EUR',
        refundId: newKey(),
      }),
    )
    const disputed = await paidDeposit({ account, customer })
    await disputePayment(disputed.payment)
    await advanceHours(72)
    await passTime()
    const books = await booksOf(account)
    expect(sum(books.charges)).toBe(10_000)
    expect(sum(books.refunds)).toBe(1200)
    expect(books.disputes).toMatchObject([{ kind: 'dispute', amount: 2500, payment: disputed.payment }])
    // Four charges at 0.63 and one dispute at 20.00.
    expect(sum(books.fees)).toBe(4 * 63 + 2000)
    // Paid out so far is what the identity leaves.
    expect(sum(books.payouts)).toBeGreaterThan(0)
    const left =
      sum(books.charges) - sum(books.refunds) - sum(books.disputes) - sum(books.fees) - sum(books.payouts)
    expect(await balanceOf(account)).toBe(left)
  })

  test('manual payouts keep every cent in the balance', async () => {
    const account = await openAccount()
    await payments().setManualPayouts({ account, key: newKey() })
    await paidDeposit({ account, customer: await newBuyer(account) })
    await advanceHours(24 * 30)
    await passTime()
    expect((await booksOf(account)).payouts).toEqual([])
    expect(valueOf(await payments().balance({ account })).available).toEqual([
      { currency: 'EUR', amount: 2500 - 63 },
    ])
  })

  test('a window holds its first second and not its last', async () => {
    const account = await openAccount()
    const { facts } = await paidDeposit({ account, customer: await newBuyer(account) })
    const [line] = (await booksOf(account)).charges
    const at = Number(line?.at.getTime())
    const later = (seconds: number) => new Date(at + seconds * 1000)
    const listed = async (from: number, to: number) =>
      valueOf(await payments().listCharges({ account, from: later(from), to: later(to) })).length
    expect([await listed(0, 1), await listed(-5, 0), await listed(1, 5)]).toEqual([1, 0, 0])
    expect(line?.payment).toBe(facts.payment)
  })
})

describe('disputes', () => {
  let account: string
  let customer: string
  beforeAll(async () => {
    account = await openAccount()
    customer = await newBuyer(account)
  })

  test('a card that disputes does so a day later; evidence can win the amount back, not the fee', async () => {
    const { payment } = await paidDeposit({ account, customer }, CARD.disputed)
    await advanceHours(25)
    await passTime()
    const [line] = valueOf(await payments().listDisputes(always(account)))
    expect(line).toMatchObject({ amount: 2500, payment })
    const dispute = String(line?.id)
    const facts = valueOf(await payments().getDispute({ account, dispute }))
    expect(facts).toMatchObject({ state: 'needs_response', reason: 'fraudulent', payment })
    expect(valueOf(await payments().getPayment({ account, payment })).disputed).toBe(true)
    const before = await balanceOf(account)
    const sent = await payments().sendEvidence({
      account,
      key: newKey(),
      dispute,
      evidence: { shippingTracking: 'RR123456785DE', notes: 'winning_evidence' },
      submit: true,
    })
    expect(valueOf(sent).state).toBe('won')
    expect(valueOf(await payments().getPayment({ account, payment })).disputed).toBe(false)
    expect((await balanceOf(account)) - before).toBe(2500)
    expect(valueOf(await payments().listDisputes(always(account)))).toEqual([])
  })

  test('one that nobody answers is lost', async () => {
    const { payment } = await paidDeposit({ account, customer })
    const dispute = await disputePayment(payment)
    await advanceHours(24 * 11)
    await passTime()
    expect(valueOf(await payments().getDispute({ account, dispute })).state).toBe('lost')
  })
})
