import { action, blocks, para, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.signInLink

export const signInLink: Write<'sign_in_link'> = (facts) => {
  const lead = words.lead(facts.validMinutes)
  return {
    subject: words.subject,
    preview: lead,
    blocks: blocks(para(lead), action(words.action, facts.signInUrl), para(words.notYou)),
  }
}
