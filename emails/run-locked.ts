import { action, blocks, para, rows, written, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.runLocked
const { labels } = mailWords

export const runLocked: Write<'run_locked'> = (facts, say) => {
  const lead = facts.belowMinimum === null ? words.lead : words.below
  const said = lead(facts.deposited, facts.minimum)
  return {
    subject: words.subject(facts.module),
    preview: said,
    blocks: blocks(
      para(said),
      facts.belowMinimum !== null && written(facts.belowMinimum),
      rows(
        { label: labels.order, value: facts.orderNumber },
        ...facts.promises.map((promise) => ({
          label: labels.postedBy(say.offer(promise.offer)),
          value: say.day(promise.postedBy),
        })),
        { label: labels.balance, value: say.money(facts.balanceMinor, facts.currency) },
      ),
      facts.balanceMinor > 0 && para(mailWords.balanceAsked[facts.balanceWhen]),
      para(words.next),
      action(labels.orderPage, facts.orderUrl),
    ),
  }
}
