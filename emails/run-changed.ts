import { action, blocks, para, rows, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.runChanged
const { labels } = mailWords

export const runChanged: Write<'run_changed'> = (facts, say) => {
  const { minimum, decideBy } = facts
  const lead =
    decideBy === null
      ? words.minimum(minimum.from, minimum.to, facts.deposited)
      : words.decideBy(say.day(decideBy.from), say.day(decideBy.to))
  return {
    subject: decideBy === null ? words.minimumSubject(facts.module) : words.decideBySubject(facts.module),
    preview: lead,
    blocks: blocks(
      para(lead),
      decideBy !== null && para(words.callsItselfOff(say.day(decideBy.callsOffOn))),
      rows({ label: labels.order, value: facts.orderNumber }),
      para(facts.isWaiting ? words.waiting : words.cancelFreely),
      action(labels.orderPage, facts.orderUrl),
    ),
  }
}
