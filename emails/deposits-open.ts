import { action, blocks, link, para, rows, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.depositsOpen

export const depositsOpen: Write<'deposits_open'> = (facts, say) => {
  const lead =
    facts.opensToAllAt === null
      ? words.leadOpen(facts.module)
      : words.lead(facts.module, say.instant(facts.opensToAllAt))
  return {
    subject: words.subject(facts.module),
    preview: lead,
    blocks: blocks(
      para(lead),
      rows(
        ...facts.offers.map((one) => ({
          label: `${facts.module}, ${say.offer(one.offer)}`,
          value: say.money(one.priceMinor, facts.currency),
          note: words.offerNote(say.money(one.depositMinor, facts.currency), say.day(one.postedBy)),
        })),
      ),
      para(facts.pricesIncludeTax ? words.withTax : words.withoutTax),
      para(words.condition(facts.minimum, facts.maximum, say.day(facts.decideBy))),
      action(words.action, facts.moduleUrl),
      link(words.takeBack, facts.takeBackUrl),
    ),
  }
}
