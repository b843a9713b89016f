import { action, blocks, link, para, rows, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.problemOpened
const { labels } = mailWords

export const problemOpened: Write<'problem_opened'> = (facts, say) => {
  const lead = words.lead(facts.what)
  return {
    subject: words.subject(facts.orderNumber),
    preview: lead,
    blocks: blocks(
      para(lead),
      rows({ label: labels.order, value: facts.orderNumber }, { label: labels.module, value: facts.module }),
      facts.answerBy !== null && para(words.answerBy(say.day(facts.answerBy))),
      facts.what === 'lost' && para(words.lost),
      para(words.add),
      action(words.action, facts.problemUrl),
      link(labels.orderPage, facts.orderUrl),
    ),
  }
}
