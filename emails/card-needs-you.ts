import { action, blocks, link, para, rows, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.cardNeedsYou
const { labels } = mailWords

export const cardNeedsYou: Write<'card_needs_you'> = (facts, say) => {
  const amount = say.money(facts.amountMinor, facts.currency)
  const lead = words.why[facts.why](amount)
  return {
    subject: words.subject(facts.orderNumber),
    preview: lead,
    blocks: blocks(
      para(lead),
      rows(
        { label: labels.module, value: facts.module },
        facts.cardEnding !== null && { label: words.card, value: facts.cardEnding },
      ),
      para(words.how),
      action(words.action(amount), facts.payUrl),
      para(words.lapse(say.day(facts.lapseOn))),
      link(labels.orderPage, facts.orderUrl),
    ),
  }
}
