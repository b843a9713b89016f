import { blocks, link, para, rows, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.refundSent
const { labels } = mailWords

export const refundSent: Write<'refund_sent'> = (facts, say) => {
  const amount = say.money(facts.amountMinor, facts.currency)
  const lead = facts.cardEnding === null ? words.lead(amount) : words.toCard(amount, facts.cardEnding)
  return {
    subject: words.subject(amount, facts.orderNumber),
    preview: lead,
    blocks: blocks(
      para(lead),
      para(words.cause[facts.cause]),
      para(words.wait),
      rows({ label: labels.order, value: facts.orderNumber }, { label: labels.module, value: facts.module }),
      link(labels.orderPage, facts.orderUrl),
    ),
  }
}
