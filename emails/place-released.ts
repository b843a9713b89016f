import { action, blocks, para, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.placeReleased

export const placeReleased: Write<'place_released'> = (facts) => ({
  subject: words.subject(facts.orderNumber, facts.module),
  preview: words.lead,
  blocks: blocks(
    para(words.lead),
    para(facts.canOrderAgain ? words.again : words.over),
    facts.canOrderAgain && action(words.action, facts.moduleUrl),
  ),
})
