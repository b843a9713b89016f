import 'server-only'
import type { Transaction } from 'sequelize'
import { isEuMember } from '@/lib/core/data/eu-members'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { OrderLine, TermsVersion, type Order } from '@/models'

/**
 * The contract on paper, as it is now: once for the deposit, and again (as a later version) when a change of the order took
 * effect.
 * Locks: nothing. Writes: one mail. Repeat: safe, one per version.
 */
export async function mailContract(
  tx: Transaction,
  order: Order,
  { version, now }: { version: number; now: Date },
): Promise<void> {
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
    version,
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
