import { action, blocks, link, para, rows, written, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.problemAnswered
const { labels } = mailWords

export const problemAnswered: Write<'problem_answered'> = (facts, say) => {
  const lead = words.lead[facts.answer]
  return {
    subject: words.subject(facts.orderNumber),
    preview: lead,
    blocks: blocks(
      para(lead),
      written(facts.text),
      rows(
        { label: labels.order, value: facts.orderNumber },
        { label: labels.module, value: facts.module },
        facts.refundMinor > 0 && { label: words.refund, value: say.money(facts.refundMinor, facts.currency) },
      ),
      action(words.action, facts.problemUrl),
      link(labels.orderPage, facts.orderUrl),
    ),
  }
}
