import { action, blocks, para, rows, written, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.runCalledOff
const { labels } = mailWords

export const runCalledOff: Write<'run_called_off'> = (facts, say) => {
  const lead = words[facts.cause]
  const refund = say.money(facts.refundMinor, facts.currency)
  return {
    subject: words.subject(facts.module),
    preview: lead,
    blocks: blocks(
      para(lead),
      facts.reason !== null && para(words.reason),
      facts.reason !== null && written(facts.reason),
      rows({ label: labels.order, value: facts.orderNumber }),
      para(facts.refundMinor > 0 ? words.refund(refund) : words.nothingPaid),
      action(labels.orderPage, facts.orderUrl),
    ),
  }
}
