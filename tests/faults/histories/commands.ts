import fc from 'fast-check'
import { BALANCE_CRASH_POINTS, DEPOSIT_CRASH_POINTS } from '@/lib/db/crash-points'
import { disputePayment } from '@/lib/gateways/payments/fake/controls'
import { payAsCustomer } from '@/lib/gateways/payments/fake/pay-as-customer'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { placeOrder } from '@/lib/services/orders/place-order'
import { checkPayment } from '@/lib/services/payments/check-payment'
import { payOrder } from '@/lib/services/payments/pay-order'
import { askBalances } from '@/lib/services/runs/ask-balances'
import { callOffRun } from '@/lib/services/runs/call-off-run'
import { lockRun } from '@/lib/services/runs/lock-run'
import { submitSignUp } from '@/lib/services/signups/submit-signup'
import { Order, PaymentAttempt, Refund } from '@/models'
import { FEES_WAIVED } from '@/tests/support/worlds/decision'
import { CARD, orderInput } from '@/tests/support/worlds/money'
import { serial } from '@/tests/support/worlds/base'
import { Command } from './command'
import type { Arrival, History, Mishap } from './history'
import * as model from './model'
import type { Model } from './model'

const MOST_ORDERS = 9

/** Before so many have ordered, nobody decides: most histories should have something to lose. */
const DECIDED_FROM = 3

/** Somebody says they would buy one: answered 202, whoever they are. */
const signUp = new Command('somebody signs up', async (told, { world, now }) => {
  const { workshop, module } = world
  const input = {
    ...{ workshop: workshop.slug, module: module.slug, offer: 'kit' as const, quantity: 1, country: 'DE' },
    ...{ certainty: 'likely' as const, email: `history-${serial()}@example.org`, updates: false },
  }
  const at = await now()
  const answer = await submitSignUp({ input, now: at })
  if (!answer.ok) throw new Error(`a sign-up was refused: ${answer.reason}`)
  told.signUps.push(at)
})

const place = (units: number, mishap: Mishap) =>
  new Command(`somebody orders ${units}${said(mishap)}`, async (told, history) => {
    if (told.orders.length >= MOST_ORDERS) return
    const buyer = await history.buyer()
    const { run } = history.world
    const placed = { buyer, id: null as string | null, links: [] as string[] }
    const input = orderInput(run, { lines: [{ offer: 'kit', quantity: units }] })
    const now = await history.now()
    const answer = await history.under(mishap, () => placeOrder({ actor: buyer.actor, input, now }))
    if (told.run !== 'taking_deposits' && answer?.ok)
      throw new Error('an order was taken by a run that is over')
    // Nobody was told: they look at their orders, as people do.
    const order = await Order.findOne({ where: { runId: run.id, personId: buyer.person.id } })
    if (answer?.ok && !order) throw new Error('an order that was confirmed is not there')
    if (!order) return
    placed.id = order.id
    if (answer?.ok && answer.value.payUrl) placed.links.push(answer.value.payUrl)
    history.orders.push(placed)
    const after = new Set([order.state])
    told.orders.push({ index: told.orders.length, units, after, card: null })
  })

const pay = (which: number, card: keyof typeof CARD, isOldLink: boolean, mishap: Mishap) =>
  new Command(
    `order ${which} pays with ${card}${isOldLink ? ' on an old link' : ''}${said(mishap)}`,
    async (told, history) => {
      const [order, placed] = chosen(which, told, history)
      if (!order || !placed?.id) return
      const { buyer, id: orderId } = placed
      const now = await history.now()
      if (!isOldLink || placed.links.length === 0) {
        const link = await history.under(mishap, () => payOrder({ actor: buyer.actor, orderId, now }))
        if (link?.ok) placed.links.push(link.value.payUrl)
      }
      const payUrl = placed.links.at(isOldLink ? 0 : -1)
      if (!payUrl) return
      const { outcome, words } = await payAsCustomer({ payUrl, card: CARD[card] })
      // A page that was paid before says so again, and takes nothing.
      const isTaken = outcome === 'captured' && words === ''
      if (isTaken) model.move([order], model.PAID, true)
    },
  )

/** The buyer comes back from the card page. */
const comeBack = (which: number, mishap: Mishap) =>
  new Command(`order ${which} comes back${said(mishap)}`, async (told, history) => {
    const [, placed] = chosen(which, told, history)
    if (!placed?.id) return
    const { buyer, id: orderId } = placed
    const now = await history.now()
    await history.under(mishap, () => checkPayment({ actor: buyer.actor, orderId, now }))
  })

const cancel = (which: number, mishap: Mishap) =>
  new Command(`order ${which} cancels${said(mishap)}`, async (told, history) => {
    const [order, placed] = chosen(which, told, history)
    if (!order || !placed?.id) return
    const { buyer, id: orderId } = placed
    const now = await history.now()
    const answer = await history.under(mishap, () => cancelOrder({ actor: buyer.actor, orderId, now }))
    if (answer === null) model.move([order], model.CANCELLED, false)
    if (answer?.ok) model.move([order], model.CANCELLED, true)
    model.move(told.orders, model.PLACE_FREED, false)
  })

const arrive = (arrival: Arrival, mishap: Mishap) =>
  new Command(`events arrive ${arrival}${said(mishap)}`, async (_, history) => {
    await history.under(mishap, () => history.receive(arrival))
  })

const work = (mishap: Mishap) =>
  new Command(`the worker works${said(mishap)}`, async (told, history) => {
    await history.under(mishap, () => history.work())
    model.move(told.orders, model.PLACE_FREED, false)
  })

/** Time passes until something falls due: the end of a hold, a charge, a lapse. */
const passToNextDue = (mishap: Mishap) =>
  new Command(`time passes until something is due${said(mishap)}`, async (told, history) => {
    const minutes = await history.minutesToNextDue()
    if (minutes !== null) await passBy(minutes, mishap, told, history)
  })

const DECIDE_BY_MINUTES = 38 * 1440

const pass = (minutes: number, mishap: Mishap) =>
  new Command(`${minutes} minutes pass${said(mishap)}`, (told, history) =>
    passBy(minutes, mishap, told, history),
  )

async function passBy(minutes: number, mishap: Mishap, told: Model, history: History): Promise<void> {
  const began = history.world.run.openedAt!.getTime()
  await history.pass(minutes, mishap)
  model.move(told.orders, model.TIME_PASSED, false)
  const isLate = (await history.now()).getTime() - began > DECIDE_BY_MINUTES * 60_000
  if (isLate && told.run === 'taking_deposits') callOff(told, true)
}

function callOff(told: Model, isSure: boolean): void {
  told.run = 'called_off'
  model.move(told.orders, model.CALLED_OFF, isSure)
}

const lock = (mishap: Mishap) =>
  new Command(`the owner locks${said(mishap)}`, async (told, history) => {
    if (told.orders.length < DECIDED_FROM) return
    const { workshop, run } = history.world
    const input = { waivers: FEES_WAIVED, reason: 'A friend takes the rest.' }
    const about = { actor: history.owner, workshopId: workshop.id, runId: run.id }
    const now = await history.now()
    const answer = await history.under(mishap, () => lockRun({ ...about, input, now }))
    await run.reload()
    if (answer?.ok && run.state !== 'locked') throw new Error('locked, it was said, and it is not')
    if (run.state !== 'locked' || told.run !== 'taking_deposits') return
    told.run = 'locked'
    model.move(told.orders, model.LOCKED, true)
    // Balances fall due at the lock: the announcement follows.
    model.move(told.orders, model.ASKED, true)
    model.move(told.orders, model.PLACE_FREED, false)
  })

const ask = new Command('the owner asks for balances', async (told, history) => {
  const { workshop, run } = history.world
  const now = await history.now()
  const about = { actor: history.owner, workshopId: workshop.id, runId: run.id }
  const answer = await askBalances({ ...about, now })
  if (answer.ok) model.move(told.orders, model.ASKED, true)
})

const callItOff = (mishap: Mishap) =>
  new Command(`the owner calls off${said(mishap)}`, async (told, history) => {
    if (told.orders.length < DECIDED_FROM) return
    const { workshop, run } = history.world
    const about = { actor: history.owner, workshopId: workshop.id, runId: run.id }
    const now = await history.now()
    await history.under(mishap, () => callOffRun({ ...about, reason: 'It cannot be built.', now }))
    await run.reload()
    if (run.state === 'called_off' && told.run !== 'called_off') callOff(told, true)
  })

const dispute = (which: number) =>
  new Command(`the bank of order ${which} disputes`, async (told, history) => {
    const [, placed] = chosen(which, told, history)
    const attempt =
      placed?.id && (await PaymentAttempt.findOne({ where: { orderId: placed.id, state: 'captured' } }))
    if (!attempt || !attempt.providerId) return
    const isGoingBack = (await Refund.count({ where: { orderId: attempt.orderId } })) > 0
    const isDisputed = (await Order.findByPk(attempt.orderId))?.disputedAt
    if (!isGoingBack && !isDisputed) await disputePayment(attempt.providerId).catch(() => {})
  })

const quiet = new Command('all is quiet', (told, history) => history.beQuiet(told))

function chosen(which: number, told: Model, history: History) {
  const index = told.orders.length === 0 ? 0 : which % told.orders.length
  return [told.orders[index], history.orders[index]] as const
}

function said(mishap: Mishap): string {
  if (mishap === null) return ''
  if ('kill' in mishap) return `, killed at ${mishap.kill}`
  return `, ${mishap.calls.map(({ n, how }) => `call ${n} breaks (${how})`).join(', ')}`
}

const breaks = fc.record({
  n: fc.integer({ min: 1, max: 5 }),
  how: fc.constantFrom('before' as const, 'after' as const, 'error_500' as const, 'error_429' as const),
})
const mishaps: fc.Arbitrary<Mishap> = fc.oneof(
  { weight: 6, arbitrary: fc.constant(null) },
  { weight: 1, arbitrary: fc.record({ calls: fc.array(breaks, { minLength: 1, maxLength: 3 }) }) },
  {
    weight: 2,
    arbitrary: fc.record({ kill: fc.constantFrom(...DEPOSIT_CRASH_POINTS, ...BALANCE_CRASH_POINTS) }),
  },
)
const which = fc.nat(MOST_ORDERS)
const cards = fc.constantFrom(
  ...(Object.keys(CARD) as (keyof typeof CARD)[]),
  'pays' as const,
  'pays' as const,
)
const arrivals = fc.constantFrom<Arrival>('as_sent', 'backwards', 'twice', 'some_late', 'some_lost')
const spans = fc.constantFrom(2, 10, 40, 1440, 8 * 1440)

/** Everything that may happen, the usual more often. */
export const COMMANDS: fc.Arbitrary<Command>[] = [
  fc.constant(signUp),
  fc.tuple(fc.integer({ min: 1, max: 2 }), mishaps).map(([units, mishap]) => place(units, mishap)),
  fc.tuple(fc.constant(1), mishaps).map(([units, mishap]) => place(units, mishap)),
  fc.tuple(fc.constant(1), mishaps).map(([units, mishap]) => place(units, mishap)),
  fc.tuple(which, cards, mishaps).map(([nth, card, mishap]) => pay(nth, card, false, mishap)),
  fc.tuple(which, cards, mishaps).map(([nth, card, mishap]) => pay(nth, card, false, mishap)),
  fc
    .tuple(which, cards, fc.boolean(), mishaps)
    .map(([nth, card, old, mishap]) => pay(nth, card, old, mishap)),
  fc.tuple(which, mishaps).map(([nth, mishap]) => comeBack(nth, mishap)),
  fc.tuple(which, mishaps).map(([nth, mishap]) => cancel(nth, mishap)),
  fc.tuple(arrivals, mishaps).map(([arrival, mishap]) => arrive(arrival, mishap)),
  fc.tuple(arrivals, mishaps).map(([arrival, mishap]) => arrive(arrival, mishap)),
  mishaps.map(work),
  mishaps.map(work),
  fc.tuple(spans, mishaps).map(([minutes, mishap]) => pass(minutes, mishap)),
  fc.tuple(spans, mishaps).map(([minutes, mishap]) => pass(minutes, mishap)),
  mishaps.map(passToNextDue),
  mishaps.map(passToNextDue),
  mishaps.map(lock),
  fc.constant(ask),
  mishaps.map(callItOff),
  which.map(dispute),
  fc.constant(quiet),
]

/** What most histories begin with: a few orders, each paid with some card. */
export const OPENINGS: fc.Arbitrary<Command[]> = fc
  .array(cards, { maxLength: 4 })
  .map((chosenCards) => [
    ...chosenCards.flatMap((card, nth) => [place(1, null), pay(nth, card, false, null)]),
    arrive('as_sent', null),
    work(null),
  ])
