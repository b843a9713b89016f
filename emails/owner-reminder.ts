import { action, blocks, para, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.ownerReminder

export const ownerReminder: Write<'owner_reminder'> = (facts, say) => {
  const { module, number, daysLeft } = facts
  const on = say.day(facts.on)
  const isDecision = facts.about === 'decide_by'
  const lead = isDecision
    ? words.decide(on, daysLeft, facts.deposited, facts.minimum)
    : words.posted(facts.offer ? say.offer(facts.offer) : module, on, daysLeft)
  return {
    subject: isDecision ? words.decideSubject(module, number, on) : words.postedSubject(module, number, on),
    preview: lead,
    blocks: blocks(
      para(lead),
      para(facts.callsOffOn === null ? words.tellFirst : words.callsOff(say.day(facts.callsOffOn))),
      action(words.action, facts.runUrl),
    ),
  }
}
