import { blocks, link, para, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.signupConfirmed

export const signupConfirmed: Write<'signup_confirmed'> = (facts, say) => {
  const lead = words.lead(say.units(facts.quantity, facts.module, facts.offer))
  return {
    subject: words.subject(facts.module),
    preview: lead,
    blocks: blocks(
      para(lead),
      para(words.next),
      para(facts.updates ? words.withUpdates : words.withoutUpdates),
      link(mailWords.labels.modulePage, facts.moduleUrl),
      link(words.action, facts.takeBackUrl),
    ),
  }
}
