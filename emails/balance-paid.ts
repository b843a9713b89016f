import { blocks, link, para, rows, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.balancePaid
const { labels } = mailWords

export const balancePaid: Write<'balance_paid'> = (facts, say) => {
  const amount = say.money(facts.amountMinor, facts.currency)
  const lead = facts.cardEnding === null ? words.lead(amount) : words.leadCard(amount, facts.cardEnding)
  return {
    subject: words.subject(facts.orderNumber, facts.module),
    preview: lead,
    blocks: blocks(
      para(lead),
      rows(
        { label: words.paidTotal, value: say.money(facts.paidTotalMinor, facts.currency) },
        ...facts.promises.map((promise) => ({
          label: labels.postedBy(say.offer(promise.offer)),
          value: say.day(promise.postedBy),
        })),
      ),
      para(words.next),
      facts.invoiceUrl !== null && link(words.invoice, facts.invoiceUrl),
      link(labels.orderPage, facts.orderUrl),
    ),
  }
}
