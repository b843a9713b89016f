import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, refuse, type Result } from '@/lib/core/result'
import { mayLapse } from '@/lib/core/states/order-guards'
import { addDays } from '@/lib/core/time/day'
import { dayIn, startOfDay } from '@/lib/core/time/zone'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { setDue } from '@/lib/jobs/set-due'
import { dropBalanceDues } from '@/lib/services/_steps/balance-dues'
import { endOpenPayments } from '@/lib/services/_steps/end-open-payments'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { releasePlace } from '@/lib/services/_steps/release-place'
import { settleLapsedDeposit } from '@/lib/services/_steps/settle-lapsed-deposit'
import { type Order, PaymentAttempt, Person, Workshop } from '@/models'

type Lapse = { state: Order['state']; isPutOff: boolean }

/**
 * Lets an order lapse over its unpaid balance, 14 days (or the workshop's own) after the failed charge: its place goes to
 * whoever waits, the deposit goes back or is kept as the terms said. What is still open at the provider is ended first;
 * a buyer who was faster has paid. While mails bounce, or the bank decides a dispute, it is put off by a day.
 * Refuses: payment_in_flight (come again). Locks: run, order, attempts. Writes: order, counts, refunds or ledger, mail, due
 * rows. Repeat: safe.
 */
export async function lapseOrder(cmd: {
  orderId: string
  now: Date
}): Promise<Result<Lapse, 'payment_in_flight' | 'not_allowed'>> {
  const { orderId, now } = cmd
  const looked = await inTransaction((tx) => judge(tx, orderId, now))
  if (!looked.ok || !looked.value.mayLapse) return looked.ok ? ok(looked.value) : looked
  const ended = await endOpenPayments(orderId, now)
  if (!ended.ok) return ended
  crashPoint('lapse_payments_ended')
  return inTransaction(async (tx) => {
    const judged = await judge(tx, orderId, now)
    if (!judged.ok || !judged.value.mayLapse) return judged
    const where = { orderId, state: [...LIVE] }
    if ((await PaymentAttempt.count({ where, transaction: tx })) > 0) return refuse('payment_in_flight')
    return lapse(tx, orderId, now)
  })
}

async function judge(tx: Transaction, orderId: string, now: Date) {
  const locked = await lockOrder(tx, orderId)
  if (!locked) return ok({ state: 'expired' as const, isPutOff: false, mayLapse: false })
  const { order } = locked
  const { state, workshopId } = order
  if (state !== 'balance_due') return ok({ state, isPutOff: false, mayLapse: false })
  const workshop = await Workshop.findByPk(workshopId, { transaction: tx, rejectOnEmpty: true })
  const person = await Person.findByPk(order.personId, { transaction: tx, rejectOnEmpty: true })
  const zone = workshop.timeZone
  const chargeFailedOn = order.balanceFailedAt && dayIn(order.balanceFailedAt, zone)
  const may = mayLapse({
    disputed: order.disputedAt !== null,
    // What is in flight is ended at the provider, then asked again.
    paymentInFlight: false,
    mailsBounce: person.mailBouncedAt !== null,
    chargeFailedOn,
    lapseAfterDays: workshop.lapseAfterDays,
    today: dayIn(now, zone),
  })
  if (may.ok) return ok({ state, isPutOff: false, mayLapse: true })
  if (chargeFailedOn === null) return ok({ state, isPutOff: false, mayLapse: false })
  const at =
    may.reason === 'not_yet'
      ? startOfDay(addDays(chargeFailedOn, workshop.lapseAfterDays), zone)
      : new Date(now.getTime() + 86_400_000)
  await setDue(tx, { kind: 'order_lapse', subjectId: orderId, workshopId, at })
  return ok({ state, isPutOff: true, mayLapse: false })
}

async function lapse(tx: Transaction, orderId: string, now: Date): Promise<Result<Lapse, 'not_allowed'>> {
  const locked = await lockOrder(tx, orderId)
  if (!locked) return refuse('not_allowed')
  const { order } = locked
  const moved = await moveOrder(tx, order, 'lapse', { now })
  if (!moved.ok) return moved
  await releasePlace(tx, order)
  await dropBalanceDues(tx, orderId)
  const then = await settleLapsedDeposit(tx, order, now)
  const { ofOrder } = await orderMailFacts(tx, order)
  const { workshopId, personId, currency, depositMinor } = order
  await queueMail(tx, {
    kind: 'order_lapsed',
    workshopId,
    personId,
    subjectId: orderId,
    props: { ...ofOrder, currency, depositMinor, depositThen: then },
    now,
  })
  return ok({ state: order.state, isPutOff: false })
}
