import { action, blocks, link, para, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.ownerDigest

export const ownerDigest: Write<'owner_digest'> = (facts, say, sender) => {
  const lead = words.lead(say.day(facts.on))
  return {
    subject: words.subject(sender.workshop, facts.items.length),
    preview: lead,
    blocks: blocks(
      para(lead),
      ...facts.items.map((item) => link(words.items[item.what](item.count), item.url)),
      action(words.action, facts.deskUrl),
      link(words.settings, facts.settingsUrl),
    ),
  }
}
