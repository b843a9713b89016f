import { blocks, link, written, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.runUpdate

export const runUpdate: Write<'run_update'> = (facts) => ({
  subject: words.subject(facts.module, facts.title),
  preview: facts.text.replaceAll(/\s+/g, ' ').slice(0, 120),
  blocks: blocks(written(facts.text), link(words.action, facts.updateUrl)),
})
