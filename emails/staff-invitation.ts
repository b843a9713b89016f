import { action, blocks, para, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.staffInvitation

export const staffInvitation: Write<'staff_invitation'> = (facts, say, sender) => {
  const lead = words.lead(facts.invitedBy, sender.workshop, facts.role)
  return {
    subject: words.subject(sender.workshop),
    preview: lead,
    blocks: blocks(
      para(lead),
      action(words.action, facts.acceptUrl),
      para(words.until(say.day(facts.validUntil))),
    ),
  }
}
