import { blocks, link, para, written, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.withdrawalAcknowledged

export const withdrawalAcknowledged: Write<'withdrawal_acknowledged'> = (facts, say) => {
  const lead = words.lead(facts.orderNumber, say.instant(facts.receivedAt))
  return {
    subject: words.subject(facts.orderNumber),
    preview: lead,
    blocks: blocks(
      para(lead),
      para(words.refund(say.money(facts.refundMinor, facts.currency), say.day(facts.refundBy))),
      facts.returnTo === null ? para(words.nothingPosted) : para(words.sendBack),
      facts.returnTo !== null && written(facts.returnTo.join('\n')),
      facts.returnBy !== null && para(words.sendBackBy(say.day(facts.returnBy))),
      link(mailWords.labels.orderPage, facts.orderUrl),
    ),
  }
}
