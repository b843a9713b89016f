import { blocks, link, para, written, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.orderCancelled

export const orderCancelled: Write<'order_cancelled'> = (facts, say) => ({
  subject: words.subject(facts.orderNumber, facts.module),
  preview: words.cause[facts.cause],
  blocks: blocks(
    para(words.cause[facts.cause]),
    facts.reason !== null && para(words.reason),
    facts.reason !== null && written(facts.reason),
    para(
      facts.refundMinor > 0 ? words.refund(say.money(facts.refundMinor, facts.currency)) : words.nothingPaid,
    ),
    link(mailWords.labels.orderPage, facts.orderUrl),
  ),
})
