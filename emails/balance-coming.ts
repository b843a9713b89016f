import { action, blocks, link, para, rows, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.balanceComing
const { labels } = mailWords

export const balanceComing: Write<'balance_coming'> = (facts, say) => {
  const amount = say.money(facts.amountMinor, facts.currency)
  const on = say.day(facts.chargeOn)
  const lead = facts.cardEnding === null ? words.pay(amount, on) : words.charge(amount, on, facts.cardEnding)
  return {
    subject: words.subject(amount, on),
    preview: lead,
    blocks: blocks(
      para(lead),
      rows(
        { label: labels.order, value: facts.orderNumber },
        { label: labels.module, value: facts.module },
        ...facts.promises.map((promise) => ({
          label: labels.postedBy(say.offer(promise.offer)),
          value: say.day(promise.postedBy),
        })),
      ),
      para(words.sooner),
      action(words.action(amount), facts.payUrl),
      para(words.address),
      link(labels.orderPage, facts.orderUrl),
    ),
  }
}
