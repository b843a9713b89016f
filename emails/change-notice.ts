import { action, blocks, link, para, rows, written, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.changeNotice

export const changeNotice: Write<'change_notice'> = (facts, say) => ({
  subject: words.subject(facts.module),
  preview: words.lead[facts.what],
  blocks: blocks(
    para(words.lead[facts.what]),
    written(facts.text),
    rows({ label: mailWords.labels.order, value: facts.orderNumber }),
    para(words.choice(say.money(facts.refundMinor, facts.currency))),
    facts.answerBy !== null && para(words.answerBy(say.day(facts.answerBy))),
    action(words.action, facts.noticeUrl),
    link(mailWords.labels.orderPage, facts.orderUrl),
  ),
})
