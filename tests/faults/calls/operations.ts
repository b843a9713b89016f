import type { OrderState } from '@/lib/core/states/order'
import { disputePayment } from '@/lib/gateways/payments/fake/controls'
import { payAsCustomer } from '@/lib/gateways/payments/fake/pay-as-customer'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { placeOrder } from '@/lib/services/orders/place-order'
import { checkPayment } from '@/lib/services/payments/check-payment'
import { payOrder } from '@/lib/services/payments/pay-order'
import { callOffRun } from '@/lib/services/runs/call-off-run'
import { lockRun } from '@/lib/services/runs/lock-run'
import { Order, PaymentAttempt } from '@/models'
import { FEES_WAIVED } from '@/tests/support/worlds/decision'
import { CARD, orderInput } from '@/tests/support/worlds/money'
import type { History, Placed } from '../histories/history'

/**
 * One thing done with money: what is there before it, the thing itself, what a person does again whose page broke (the
 * queue does its own again), and where the orders of the run stand in the end, in the order they were placed.
 */
export type Operation = {
  before: (history: History) => Promise<void>
  act: (history: History) => Promise<unknown>
  again?: (history: History) => Promise<unknown>
  ends: OrderState[]
}

const DAY = 1440

async function place(history: History): Promise<Placed> {
  const buyer = await history.buyer()
  const now = await history.now()
  const input = orderInput(history.world.run)
  const answer = await placeOrder({ actor: buyer.actor, input, now })
  if (!answer.ok) throw new Error(answer.reason)
  const placed = { buyer, id: answer.value.order, links: [answer.value.payUrl ?? ''] }
  history.orders.push(placed)
  return placed
}

async function payFor({ links }: Placed, card: string = CARD.pays): Promise<void> {
  const { outcome } = await payAsCustomer({ payUrl: links.at(-1)!, card })
  if (outcome !== 'captured') throw new Error('the card was refused')
}

async function reserve(history: History, card: string = CARD.pays): Promise<Placed> {
  const placed = await place(history)
  await payFor(placed, card)
  await history.settle()
  return placed
}

/** A link for what is due, and the card handed in, unless it is paid by now. */
async function payAgain(history: History): Promise<void> {
  const placed = history.orders[0]!
  const now = await history.now()
  const link = await payOrder({ actor: placed.buyer.actor, orderId: placed.id!, now })
  if (!link.ok && link.reason !== 'nothing_to_pay') throw new Error(link.reason)
  if (link.ok) await payAsCustomer({ payUrl: link.value.payUrl, card: CARD.pays })
}

const about = ({ owner, world }: History) => ({
  actor: owner,
  workshopId: world.workshop.id,
  runId: world.run.id,
})

async function lock(history: History) {
  const input = { waivers: FEES_WAIVED, reason: 'A friend takes the rest.' }
  return lockRun({ ...about(history), input, now: await history.now() })
}

/** Locked, announced, and the day on which the cards are charged has come. */
async function untilCharge(history: History, card: string): Promise<void> {
  await reserve(history, card)
  await lock(history)
  await history.settle()
  await history.moveClock(7 * DAY + 10)
}

const cancel = async (history: History) => {
  const { buyer, id } = history.orders[0]!
  return cancelOrder({ actor: buyer.actor, orderId: id!, now: await history.now() })
}

const callOff = async (history: History) => {
  await callOffRun({ ...about(history), reason: 'It cannot be built.', now: await history.now() })
  await history.work()
}

const fallDue = async (history: History) => {
  await history.pass(0)
  await history.work()
}

export const OPERATIONS: Record<string, Operation> = {
  'an order is placed': {
    before: async (history) =>
      void history.orders.push({ buyer: await history.buyer(), id: null, links: [] }),
    act: async (history) => {
      const { run } = history.world
      const input = { ...orderInput(run), address: { ...orderInput(run).address, lines: ['Hof 1'] } }
      const { buyer } = history.orders[0]!
      await placeOrder({ actor: buyer.actor, input, now: await history.now() })
    },
    again: async (history) => {
      const placed = history.orders[0]!
      const where = { runId: history.world.run.id, personId: placed.buyer.person.id }
      const there = await Order.findOne({ where })
      if (!there) await OPERATIONS['an order is placed']!.act(history)
      placed.id = (await Order.findOne({ where, rejectOnEmpty: true })).id
      await history.settle()
      await history.pass(2)
      await payAgain(history)
    },
    ends: ['reserved'],
  },
  'a deposit arrives': {
    before: async (history) => payFor(await place(history)),
    act: async (history) => {
      await history.receive('as_sent')
      await history.work()
    },
    ends: ['reserved'],
  },
  'a buyer comes back whose event is late': {
    before: async (history) => payFor(await place(history)),
    act: async (history) => {
      const { buyer, id } = history.orders[0]!
      await checkPayment({ actor: buyer.actor, orderId: id!, now: await history.now() })
    },
    ends: ['reserved'],
  },
  'a hold ends': {
    before: async (history) => {
      await place(history)
      await history.moveClock(40)
    },
    act: fallDue,
    ends: ['expired'],
  },
  'an order is cancelled while its card page is open': {
    before: async (history) => void (await place(history)),
    act: cancel,
    again: cancel,
    ends: ['cancelled'],
  },
  'an order is cancelled and its deposit goes back': {
    before: async (history) => void (await reserve(history)),
    act: async (history) => {
      await cancel(history)
      await history.work()
    },
    again: cancel,
    ends: ['cancelled'],
  },
  'a run is locked': {
    before: async (history) => {
      await reserve(history)
      await place(history)
    },
    act: lock,
    again: async (history) => {
      await history.pass(2)
      await lock(history)
    },
    ends: ['balance_due', 'expired'],
  },
  'a balance is charged': {
    before: (history) => untilCharge(history, CARD.pays),
    act: fallDue,
    ends: ['paid'],
  },
  'a balance is charged and the bank wants the buyer, who pays': {
    before: (history) => untilCharge(history, CARD.asksAlways),
    act: fallDue,
    again: async (history) => {
      await history.settle()
      await history.pass(2)
      await payAgain(history)
    },
    ends: ['paid'],
  },
  'a balance is refused and another card pays it': {
    before: async (history) => {
      await untilCharge(history, CARD.refusedLater)
      await fallDue(history)
    },
    act: payAgain,
    again: async (history) => {
      await history.settle()
      await history.pass(2)
      await payAgain(history)
    },
    ends: ['paid'],
  },
  'an order lapses and its deposit goes back': {
    before: async (history) => {
      await untilCharge(history, CARD.refusedLater)
      await fallDue(history)
      await history.moveClock(15 * DAY)
    },
    act: fallDue,
    ends: ['lapsed'],
  },
  'a run is called off': {
    before: async (history) => {
      await reserve(history)
      await place(history)
    },
    act: callOff,
    again: async (history) => {
      await history.world.run.reload()
      if (history.world.run.state !== 'called_off') await callOff(history)
    },
    ends: ['cancelled', 'cancelled'],
  },
  'a bank disputes': {
    before: async (history) => {
      const { id } = await reserve(history)
      const attempt = await PaymentAttempt.findOne({ where: { orderId: id! }, rejectOnEmpty: true })
      await disputePayment(attempt.providerId!)
    },
    act: async (history) => {
      await history.receive('as_sent')
      await history.work()
    },
    ends: ['reserved'],
  },
}
