import { action, blocks, link, para, rows, written, type Write } from '@/emails/_letter'
import { type MailProps } from '@/lib/contracts/mails'
import { mailWords } from '@/lib/messages/mails'
import { type Say } from '@/emails/_say'

const words = mailWords.delayNotice

function silence({ silenceMeans, answerBy }: MailProps<'delay_notice'>, say: Say): string {
  if (silenceMeans === 'cancel')
    return answerBy ? words.silence.cancelOn(say.day(answerBy)) : words.silence.cancel
  return answerBy ? words.silence.waitUntil(say.day(answerBy)) : words.silence.wait
}

export const delayNotice: Write<'delay_notice'> = (facts, say) => {
  const lead = words.lead[facts.occasion](facts.orderNumber)
  return {
    subject: words.subject[facts.occasion](facts.module),
    preview: lead,
    blocks: blocks(
      para(lead),
      rows(
        ...facts.delays.map((delay) => ({
          label: `${facts.module}, ${say.offer(delay.offer)}`,
          value: delay.revisedBy ? words.now(say.day(delay.revisedBy)) : words.noDate,
          note: words.promised(say.day(delay.promisedBy)),
        })),
      ),
      facts.reason !== null && para(words.reason),
      facts.reason !== null && written(facts.reason),
      para(words.choices(say.money(facts.refundMinor, facts.currency))),
      para(silence(facts, say)),
      facts.refundBy !== null && para(words.refundBy(say.day(facts.refundBy))),
      action(words.action, facts.noticeUrl),
      link(mailWords.labels.orderPage, facts.orderUrl),
    ),
  }
}
