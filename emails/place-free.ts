import { action, blocks, link, para, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.placeFree

export const placeFree: Write<'place_free'> = (facts, say) => {
  const lead = words.lead(say.instant(facts.holdUntil))
  const deposit = say.money(facts.depositMinor, facts.currency)
  return {
    subject: words.subject(facts.orderNumber, facts.module),
    preview: lead,
    blocks: blocks(
      para(lead),
      para(words.how(deposit)),
      action(words.action(deposit), facts.payUrl),
      link(mailWords.labels.orderPage, facts.orderUrl),
    ),
  }
}
