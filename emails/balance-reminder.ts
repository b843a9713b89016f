import { action, blocks, link, para, rows, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.balanceReminder
const { labels } = mailWords

export const balanceReminder: Write<'balance_reminder'> = (facts, say) => {
  const amount = say.money(facts.amountMinor, facts.currency)
  const lead = words.lead(amount)
  const deposit = say.money(facts.depositMinor, facts.currency)
  return {
    subject: words.subject(facts.nth, amount, facts.orderNumber),
    preview: lead,
    blocks: blocks(
      para(lead),
      rows({ label: labels.order, value: facts.orderNumber }, { label: labels.module, value: facts.module }),
      action(words.action(amount), facts.payUrl),
      para(words.lapse(say.day(facts.lapseOn))),
      facts.depositMinor > 0 && para(words.depositThen[facts.depositThen](deposit)),
      para(words.trouble),
      link(labels.orderPage, facts.orderUrl),
    ),
  }
}
