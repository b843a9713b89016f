import 'server-only'
import type { ReportProblemInput } from '@/lib/contracts/problems'
import { env } from '@/lib/config/env'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { next, PROBLEM_MOVES } from '@/lib/core/states/problem'
import { addDays } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { paths } from '@/lib/paths'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { nextNumber } from '@/lib/services/_steps/next-number'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { recordMove } from '@/lib/services/_steps/record-move'
import { sentParcelOf } from '@/lib/services/_steps/sent-parcel-of'
import { Order, Problem } from '@/models'

/** Days by which a buyer hears; own rule, shown to the buyer at once. */
const ANSWER_DAYS = 5

/**
 * Takes a buyer's report about an order of which something was handed over; they are told by when they hear.
 * Refuses: not_found · nothing_posted · problem_open (the same is reported already and not answered). Locks: run, order.
 * Writes: problem, audit, mail. Repeat: refused as problem_open.
 */
export async function reportProblem(cmd: {
  actor: Actor
  orderId: string
  input: ReportProblemInput
  now: Date
}) {
  const { actor, orderId, input, now } = cmd
  const seen = await Order.findByPk(orderId, { attributes: ['personId', 'workshopId'] })
  if (!seen || actor.kind !== 'person' || !can(actor, 'problem:open', seen)) return refuse('not_found')
  return inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    const opened = next(PROBLEM_MOVES, null, 'open')
    if (!locked || !opened.ok) return refuse('not_found')
    const { order } = locked
    const parcel = await sentParcelOf(tx, order.id)
    if (!parcel) return refuse('nothing_posted')
    const same = { orderId, kind: input.kind, state: 'open' as const }
    if ((await Problem.count({ where: same, transaction: tx })) > 0) return refuse('problem_open')
    const { ofOrder, workshop } = await orderMailFacts(tx, order)
    const answerByOn = addDays(dayIn(now, workshop.timeZone), ANSWER_DAYS)
    const problem = await Problem.create(
      {
        workshopId: order.workshopId,
        number: await nextNumber(tx, order.workshopId, 'problem'),
        orderId,
        orderLineId: null,
        parcelId: parcel.id,
        kind: input.kind,
        story: input.story,
        state: opened.value,
        remedy: null,
        answer: null,
        lessonId: null,
        openedAt: now,
        answerByOn,
        answeredAt: null,
        closedAt: null,
      },
      { transaction: tx },
    )
    await recordMove(tx, {
      ...{ workshopId: order.workshopId, subjectType: 'problem', subjectId: problem.id, at: now },
      ...{ from: null, event: 'open', to: opened.value, byPersonId: actor.personId },
    })
    await queueMail(tx, {
      kind: 'problem_opened',
      workshopId: order.workshopId,
      personId: order.personId,
      subjectId: problem.id,
      props: {
        ...ofOrder,
        what: input.kind,
        answerBy: answerByOn,
        problemUrl: `${env().BASE_URL}${paths.accountOrder(order.id)}#problems`,
      },
      now,
    })
    return ok({ problem: problem.id, answerBy: answerByOn })
  })
}
