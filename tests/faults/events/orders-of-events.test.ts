import Stripe from 'stripe'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { payments } from '@/lib/gateways/payments'
import { disputePayment } from '@/lib/gateways/payments/fake/controls'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { chargeBalance } from '@/lib/services/payments/charge-balance'
import { payOrder } from '@/lib/services/payments/pay-order'
import {
  Dispute,
  LedgerEntry,
  LedgerTransfer,
  MailOutbox,
  type Order,
  PaymentAttempt,
  Refund,
} from '@/models'
import { compareBooks } from '@/tests/support/books'
import { businessTime, setBusinessTime } from '@/tests/support/business-time'
import { NOW } from '@/tests/support/worlds/base'
import { CARD, moneyWorld, pay, placed, toOurDoor } from '@/tests/support/worlds/money'
import { closeQueue, work } from '../support/queue'

// Five events of one thing may arrive in 120 orders. Whichever it is, the same stands in our books in the end.
const EVERY = process.env.FAULTS === 'long' ? 1 : 10
const ORDERS = permutations([0, 1, 2, 3, 4]).filter((_, index) => index % EVERY === 0)

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeAll(async () => {
  world = await moneyWorld({ maximum: 500 })
  await takeEvents()
})
afterAll(async () => {
  await closeQueue()
  await closeSandboxPool()
})

function permutations(items: readonly number[]): number[][] {
  if (items.length === 0) return [[]]
  return items.flatMap((first) =>
    permutations(items.filter((item) => item !== first)).map((rest) => [first, ...rest]),
  )
}

/** What the provider has sent since, as sent. */
async function takeEvents(): Promise<string[]> {
  const bodies: string[] = []
  await deliverDueEvents({ isHurried: true, deliver: async (body) => (bodies.push(body), 200) })
  return bodies
}

const typeOf = (body: string) => (JSON.parse(body) as { type: string }).type

async function arrive(body: string): Promise<void> {
  const secret = process.env.STRIPE_WEBHOOK_SECRETS!
  const signature = Stripe.webhooks.generateTestHeaderString({ payload: body, secret })
  expect(await toOurDoor(body, signature)).toBe(200)
  expect(await work(['apply_provider_event', 'send_refund'])).toBe(0)
}

/** What stands of an order, without ids and times. */
async function standing(order: Order) {
  await order.reload()
  const where = { orderId: order.id }
  const transfers = await LedgerTransfer.findAll({ where, include: [{ model: LedgerEntry, as: 'entries' }] })
  const sums: Record<string, number> = {}
  for (const { entries = [] } of transfers)
    for (const { account, amountMinor } of entries) sums[account] = (sums[account] ?? 0) + amountMinor
  const attempts = await PaymentAttempt.findAll({ where, order: ['purpose', 'sequence'] })
  const mails = await MailOutbox.findAll({
    where: { subjectId: [order.id, ...attempts.map(({ id }) => id)] },
  })
  return {
    state: order.state,
    isDisputed: order.disputedAt !== null,
    attempts: attempts.map(({ purpose, state, amountMinor }) => `${purpose} ${state} ${amountMinor}`),
    transfers: transfers.map(({ kind }) => kind).sort(),
    held: sums['provider_balance'] ?? 0,
    deposits: sums['customer_deposits'] ?? 0,
    disputes: (await Dispute.findAll({ where })).map(({ state }) => state),
    refunds: (await Refund.findAll({ where })).length,
    mails: mails.map(({ kind }) => kind).sort(),
  }
}

type Happening = {
  types: string[]
  make: () => Promise<{ order: Order; events: string[] }>
  ends: Awaited<ReturnType<typeof standing>>
}

/** By hand, from the fake's prices: a kit is 95.00 and 4.90 of postage, 25.00 of it deposit; 1.5 % and 0.25 of fees. */
const DEPOSIT = 2500
const DEPOSIT_FEE = 63
const BALANCE = 7490
const BALANCE_FEE = 137
const DISPUTE_FEE = 2000

const HAPPENINGS: Record<string, Happening> = {
  'a card that was refused, another that asked its bank, a deposit paid': {
    types: [
      'charge.updated',
      'checkout.session.completed',
      'payment_intent.payment_failed',
      'payment_intent.requires_action',
      'payment_intent.succeeded',
    ],
    make: async () => {
      const { order, payUrl } = await placed(world.run)
      await pay(payUrl, CARD.refused)
      await pay(payUrl, CARD.asksAlways)
      return { order, events: await takeEvents() }
    },
    ends: {
      state: 'reserved',
      isDisputed: false,
      attempts: [`deposit captured ${DEPOSIT}`],
      transfers: ['deposit_paid', 'fee_charged'],
      held: DEPOSIT - DEPOSIT_FEE,
      deposits: -DEPOSIT,
      disputes: [],
      refunds: 0,
      mails: ['deposit_received'],
    },
  },
  'a balance whose bank wanted the buyer, who finished it; the fee of the deposit told late': {
    types: [
      'charge.updated',
      'charge.updated',
      'payment_intent.payment_failed',
      'payment_intent.requires_action',
      'payment_intent.succeeded',
    ],
    make: async () => {
      const { order, actor, feeNews } = await reservedNow(CARD.asksAlways)
      const now = await businessTime()
      await order.update({ state: 'balance_due', balanceAskedAt: now, balanceChargeAt: now })
      await chargeBalance({ orderId: order.id, now })
      const link = await payOrder({ actor, orderId: order.id, now })
      if (!link.ok) throw new Error(link.reason)
      await pay(link.value.payUrl)
      return { order, events: [...feeNews, ...(await takeEvents())] }
    },
    ends: {
      state: 'paid',
      isDisputed: false,
      attempts: [`balance captured ${BALANCE}`, `deposit captured ${DEPOSIT}`],
      transfers: ['balance_paid', 'deposit_paid', 'fee_charged', 'fee_charged'],
      held: DEPOSIT - DEPOSIT_FEE + BALANCE - BALANCE_FEE,
      deposits: -(DEPOSIT + BALANCE),
      disputes: [],
      refunds: 0,
      mails: ['balance_paid', 'card_needs_you', 'deposit_received'],
    },
  },
  'a dispute, answered and won': {
    types: [
      'charge.dispute.closed',
      'charge.dispute.created',
      'charge.dispute.funds_reinstated',
      'charge.dispute.funds_withdrawn',
      'charge.dispute.updated',
    ],
    make: async () => {
      const { order, feeNews } = await reservedNow(CARD.pays)
      for (const body of feeNews) await arrive(body)
      const attempt = await PaymentAttempt.findOne({ where: { orderId: order.id }, rejectOnEmpty: true })
      const dispute = await disputePayment(attempt.providerId!)
      const evidence = { notes: 'winning_evidence' }
      const key = `evidence:${dispute}`
      const sent = await payments().sendEvidence({
        account: world.account,
        key,
        dispute,
        evidence,
        submit: true,
      })
      expect(sent).toMatchObject({ ok: true, value: { state: 'won' } })
      return { order, events: await takeEvents() }
    },
    ends: {
      state: 'reserved',
      isDisputed: false,
      attempts: [`deposit captured ${DEPOSIT}`],
      transfers: ['deposit_paid', 'dispute_won', 'disputed', 'fee_charged'],
      held: DEPOSIT - DEPOSIT_FEE - DISPUTE_FEE,
      deposits: -DEPOSIT,
      disputes: ['won'],
      refunds: 0,
      mails: ['deposit_received'],
    },
  },
}

/** An order under deposit, and the news of its fee, which is still on its way. */
async function reservedNow(card: string) {
  const made = await placed(world.run)
  await pay(made.payUrl, card)
  const events = await takeEvents()
  for (const body of events) if (typeOf(body) === 'payment_intent.succeeded') await arrive(body)
  return { ...made, feeNews: events.filter((body) => typeOf(body) === 'charge.updated') }
}

describe.each(Object.entries(HAPPENINGS))('%s', (_, { types, make, ends }) => {
  test(`ends alike in ${ORDERS.length} orders of its events`, async () => {
    for (const sequence of ORDERS) {
      await setBusinessTime(NOW)
      const { order, events } = await make()
      events.sort((a, b) => (typeOf(a) < typeOf(b) ? -1 : 1))
      expect(events.map(typeOf)).toEqual(types)
      for (const index of sequence) await arrive(events[index]!)
      expect(await standing(order), sequence.join(' ')).toEqual(ends)
    }
    expect((await compareBooks([world.workshop])).wrong).toEqual([])
  }, 600_000)
})
