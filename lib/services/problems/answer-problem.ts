import 'server-only'
import type { Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import { refuseFields } from '@/lib/contracts/problem'
import type { AnswerProblemInput } from '@/lib/contracts/problems'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { next, PROBLEM_MOVES } from '@/lib/core/states/problem'
import { inTransaction } from '@/lib/db/in-transaction'
import { problemMistakes as words } from '@/lib/messages/problems'
import { paths } from '@/lib/paths'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { lockParcel } from '@/lib/services/_steps/lock-parcel'
import { openReplacement } from '@/lib/services/_steps/open-replacement'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { recordMove } from '@/lib/services/_steps/record-move'
import { refundOrder } from '@/lib/services/_steps/refund-order'
import { refundPart } from '@/lib/services/_steps/refund-part'
import { reportParcelState } from '@/lib/services/_steps/report-parcel'
import { sentParcelOf } from '@/lib/services/_steps/sent-parcel-of'
import { type Order, Problem } from '@/models'

type Command = {
  actor: Actor
  workshopId: string
  problemId: string
  input: AnswerProblemInput
  now: Date
}

/**
 * Answers a buyer's report: a replacement comes into the pack queue, money goes back the way it came, the buyer is written
 * to. A parcel reported as not arrived and replaced is given up as lost: that is the seller's loss.
 * Refuses: forbidden · not_found · not_allowed (answered already) · order_disputed · nothing_posted · invalid, at
 * `refundMinor`. Locks: run, order, problem, the parcel, the order's payments. Writes: problem, parcel, refunds, mail,
 * audit. Repeat: refused as not_allowed.
 */
export function answerProblem(cmd: Command) {
  const { actor, workshopId, problemId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'problem:answer', { workshopId })) return refuse('forbidden')
    const seen = await Problem.findOne({ where: { id: problemId, workshopId }, transaction: tx })
    const locked = seen && (await lockOrder(tx, seen.orderId))
    if (!locked) return refuse('not_found')
    const { order } = locked
    const problem = await Problem.findByPk(problemId, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    const to = next(PROBLEM_MOVES, problem.state, 'answer')
    if (!to.ok) return to
    const by = { now, byPersonId: actor.personId }
    const refunded = await payBack(tx, order, input, by)
    if (!refunded.ok) return refunded
    if (input.remedy === 'replacement') {
      const sent = await replace(tx, order, problem, by)
      if (!sent.ok) return sent
    }
    const from = problem.state
    await problem.update(
      { state: to.value, remedy: input.remedy, answer: input.answer, answeredAt: now },
      { transaction: tx },
    )
    await recordMove(tx, {
      ...{ workshopId, subjectType: 'problem', subjectId: problem.id, at: now },
      ...{ from, event: 'answer', to: to.value, byPersonId: actor.personId },
    })
    const { ofOrder } = await orderMailFacts(tx, order)
    await queueMail(tx, {
      kind: 'problem_answered',
      ...{ workshopId, personId: order.personId, subjectId: problem.id },
      props: {
        ...ofOrder,
        currency: order.currency,
        answer: input.remedy,
        text: input.answer,
        refundMinor: refunded.value,
        problemUrl: `${env().BASE_URL}${paths.accountOrder(order.id)}#problems`,
      },
      now,
    })
    return ok({ problem: problem.id, state: to.value, refundMinor: refunded.value })
  })
}

async function payBack(
  tx: Transaction,
  order: Order,
  { remedy, refundMinor }: AnswerProblemInput,
  by: { now: Date; byPersonId: string },
) {
  if (remedy !== 'part_refund' && remedy !== 'full_refund') return ok(0)
  if (order.disputedAt !== null) return refuse('order_disputed')
  if (remedy === 'full_refund') {
    const all = await refundOrder(tx, { order, why: 'problem', ...by })
    return ok(Number(all.refundMinor))
  }
  if (!refundMinor) return refuseFields({ refundMinor: words.sum })
  const given = await refundPart(tx, { order, amountMinor: refundMinor, why: 'problem', ...by })
  return given === refundMinor ? ok(given) : refuseFields({ refundMinor: words.tooMuch })
}

async function replace(
  tx: Transaction,
  order: Order,
  problem: Problem,
  by: { now: Date; byPersonId: string },
) {
  const replaced = await sentParcelOf(tx, order.id)
  if (!replaced) return refuse('nothing_posted')
  if (problem.kind === 'lost' && replaced.state === 'handed_over') {
    const locked = await lockParcel(tx, { workshopId: order.workshopId, parcelId: replaced.id })
    if (locked) await reportParcelState(tx, locked, 'lost', by)
  }
  return ok(await openReplacement(tx, { order, problem, replaced, ...by }))
}
