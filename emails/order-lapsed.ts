import { blocks, link, para, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.orderLapsed

export const orderLapsed: Write<'order_lapsed'> = (facts, say) => ({
  subject: words.subject(facts.orderNumber, facts.module),
  preview: words.lead,
  blocks: blocks(
    para(words.lead),
    facts.depositMinor > 0 &&
      para(words.depositThen[facts.depositThen](say.money(facts.depositMinor, facts.currency))),
    para(words.mistake),
    link(mailWords.labels.orderPage, facts.orderUrl),
  ),
})
