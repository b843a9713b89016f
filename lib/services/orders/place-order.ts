import 'server-only'
import type { Transaction } from 'sequelize'
import type { OrderInput, OrderPlaced } from '@/lib/contracts/orders'
import type { Actor } from '@/lib/core/policy/can'
import { can } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { quoteOrder } from '@/lib/queries/orders/quote-order'
import { addAddress } from '@/lib/services/_steps/add-address'
import { addressFingerprint } from '@/lib/services/_steps/address-fingerprint'
import { ensureCustomer } from '@/lib/services/_steps/ensure-customer'
import { holdUntil } from '@/lib/services/_steps/hold-until'
import { openCardSession } from '@/lib/services/_steps/open-card-session'
import { placeOrQueue } from '@/lib/services/_steps/place-rules'
import { releaseUnpayable } from '@/lib/services/_steps/release-unpayable'
import { requestCardSession, sessionEnd } from '@/lib/services/_steps/request-card-session'
import { takePlace } from '@/lib/services/_steps/take-place'
import { writeOrder } from '@/lib/services/_steps/write-order'
import { Module, Order, type PaymentAttempt, Person, Run, Workshop } from '@/models'

type Cmd = { actor: Actor; input: OrderInput; now: Date }

/**
 * Places an order: fixes price, tax, postage, promises and terms, takes a place and opens the card page for its deposit;
 * or, when no place is left, enters the waiting list.
 * Refuses: forbidden · not_found · workshop_suspended · cannot_charge · provider_unreachable · field mistakes ·
 * weights_missing · run_not_open · decide_by_past · not_open_to_all_yet · limit_reached · already_ordered ·
 * provider_refused (the place is given back).
 * Locks: the run; the database forbids more units than its maximum. Writes: order, lines, address, counts, attempt, due
 * rows, audit; after the provider's answer the attempt. Repeat: refused as already_ordered; the route's Idempotency-Key
 * repeats the answer.
 */
export async function placeOrder(cmd: Cmd) {
  const { actor, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'order:place', {})) return refuse('forbidden')
  const seen = await Run.findByPk(cmd.input.run)
  if (!seen || seen.state === 'draft') return refuse('not_found')
  if (seen.state !== 'taking_deposits') return refuse('run_not_open')
  const workshop = await Workshop.findByPk(seen.workshopId, { rejectOnEmpty: true })
  if (workshop.state !== 'open') return refuse('workshop_suspended')
  const person = await Person.findByPk(actor.personId, { rejectOnEmpty: true })
  const customer = await ensureCustomer(workshop, person, now)
  if (!customer.ok) return customer

  const placed = await inTransaction((tx) =>
    place(tx, cmd, { personId: person.id, customer: customer.value }),
  )
  if (!placed.ok) return placed
  const { order, attempt, position } = placed.value
  if (!attempt) return ok(answer(order, null, position))
  crashPoint('order_placed')
  const session = await openCardSession(attempt.id, now)
  if (!session.ok) {
    await releaseUnpayable(order.id, now)
    return session
  }
  return ok(answer(order, session.value.payUrl, null))
}

const answer = (order: Order, payUrl: string | null, position: number | null): OrderPlaced => ({
  order: order.id,
  state: position === null ? 'awaiting_deposit' : 'waiting',
  payUrl,
  position,
})

async function place(tx: Transaction, cmd: Cmd, by: { personId: string; customer: string }) {
  const { input, now } = cmd
  const run = await Run.findByPk(input.run, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
  const workshop = await Workshop.findByPk(run.workshopId, { transaction: tx, rejectOnEmpty: true })
  const quote = await quoteOrder({ workshop, run, input, now, transaction: tx })
  if (!quote.ok) return quote
  const fingerprint = addressFingerprint(input.address)
  const asked = { run, workshop, quote: quote.value, now, personId: by.personId, fingerprint }
  const allowed = await placeOrQueue(tx, asked)
  if (!allowed.ok) return allowed

  const { workshopId } = run
  const address = await addAddress(tx, { workshopId, personId: by.personId, address: input.address, now })
  const holdEnd = allowed.value === 'place' ? sessionEnd(workshop, now) : null
  const order = await writeOrder(tx, { ...asked, address, holdUntil: holdEnd })
  if (holdEnd === null) {
    const position = await Order.count({ where: { runId: run.id, state: 'waiting' }, transaction: tx })
    return ok({ order, attempt: null, position })
  }
  await takePlace(tx, order)
  await holdUntil(tx, order, holdEnd)
  const module = await Module.findByPk(run.moduleId, { transaction: tx, rejectOnEmpty: true })
  const attempt: PaymentAttempt | null = await requestCardSession(tx, {
    order,
    due: { purpose: 'deposit', amountMinor: order.depositMinor },
    workshop,
    module,
    customer: by.customer,
    now,
  })
  return ok({ order, attempt, position: null })
}
