import { action, blocks, para, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.confirmSignup

export const confirmSignup: Write<'confirm_signup'> = (facts, say) => {
  const lead = words.lead(say.units(facts.quantity, facts.module, facts.offer))
  return {
    subject: words.subject(facts.module),
    preview: lead,
    blocks: blocks(
      para(lead),
      action(words.action, facts.confirmUrl),
      para(words.after(say.day(facts.deleteOn))),
    ),
  }
}
