import 'server-only'
import type { Transaction } from 'sequelize'
import { isEuMember } from '@/lib/core/data/eu-members'
import type { PaymentFacts } from '@/lib/gateways/payments/types'
import { dropDue } from '@/lib/jobs/set-due'
import { modulePageChanged } from '@/lib/services/_steps/module-page-changed'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { saveCard } from '@/lib/services/_steps/save-card'
import { takePlace } from '@/lib/services/_steps/take-place'
import type { LockedPayment } from '@/lib/services/_steps/locked-payment'
import { OrderLine, TermsVersion, type Order } from '@/models'

/**
 * A deposit counts: the order is reserved (one whose hold had ended takes its place again), the card is remembered for
 * the balance, and the buyer gets the contract on paper.
 * Run and order are locked by the caller. Writes: order, counts, saved card, mail, page. Repeat: not safe; called once
 * per capture.
 */
export async function acceptDeposit(
  tx: Transaction,
  { order, run }: LockedPayment,
  payment: PaymentFacts,
  now: Date,
): Promise<void> {
  const isLate = order.state === 'expired'
  const moved = await moveOrder(tx, order, isLate ? 'late_capture' : 'deposit_captured', { now })
  if (!moved.ok) throw new Error(`order ${order.id} cannot take a deposit from ${order.state}`)
  if (isLate) await takePlace(tx, order)
  else await modulePageChanged(tx, run.moduleId)
  await dropDue(tx, 'hold_ended', order.id)
  await saveCard(tx, order, payment, now)
  await mailDepositReceived(tx, order, now)
}

async function mailDepositReceived(tx: Transaction, order: Order, now: Date): Promise<void> {
  const { run, ofOrder, module } = await orderMailFacts(tx, order)
  const lines = await OrderLine.findAll({
    where: { orderId: order.id },
    order: [['position', 'ASC']],
    transaction: tx,
  })
  const terms = await TermsVersion.findByPk(order.termsVersionId ?? '', {
    transaction: tx,
    rejectOnEmpty: true,
  })
  await queueMail(tx, {
    kind: 'deposit_received',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    props: {
      ...ofOrder,
      currency: order.currency,
      lines: lines.map((line) => ({
        module: module.name,
        offer: line.offerKind,
        quantity: line.quantity,
        choices: line.choices.map(({ question, label }) => ({ question, answer: label })),
        totalMinor: line.totalMinor,
        postedBy: line.postedByOn,
      })),
      postageMinor: order.postageMinor,
      taxMinor: order.taxMinor,
      taxIncluded: order.pricesIncludeTax,
      totalMinor: order.totalMinor,
      depositMinor: order.depositMinor,
      balanceMinor: order.balanceMinor,
      balanceWhen: run.balanceWhen,
      minimum: run.minimum,
      decideBy: run.decideByOn,
      withdrawal: isEuMember(order.country) || order.country === 'GB' ? 'by_law' : 'by_terms',
      terms: { version: String(terms.number), text: terms.body },
    },
    now,
  })
}
