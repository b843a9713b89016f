import { action, blocks, para, rows, terms, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.depositReceived
const { labels } = mailWords

export const depositReceived: Write<'deposit_received'> = (facts, say) => {
  const money = (amount: number) => say.money(amount, facts.currency)
  const lead = words.lead(money(facts.depositMinor))
  const lines = facts.lines.map((line) => ({
    label: say.units(line.quantity, line.module, line.offer),
    value: money(line.totalMinor),
    note: [
      ...line.choices.map(({ question, answer }) => `${question}: ${answer}`),
      words.lineNote(say.day(line.postedBy)),
    ].join('; '),
  }))
  const tax = {
    label: facts.taxIncluded ? labels.taxIncluded : labels.taxAdded,
    value: money(facts.taxMinor),
  }
  return {
    subject: words.subject(facts.orderNumber, facts.module),
    preview: lead,
    blocks: blocks(
      para(lead),
      rows(
        ...lines,
        { label: labels.postage, value: money(facts.postageMinor) },
        facts.taxMinor > 0 && !facts.taxIncluded && tax,
        { label: labels.total, value: money(facts.totalMinor), strong: true },
        facts.taxMinor > 0 && facts.taxIncluded && tax,
        { label: words.paidNow, value: money(facts.depositMinor) },
        { label: words.paidLater, value: money(facts.balanceMinor) },
      ),
      facts.balanceMinor > 0 && para(mailWords.balanceAsked[facts.balanceWhen]),
      para(words.condition(facts.minimum, say.day(facts.decideBy))),
      para(words.withdrawal[facts.withdrawal]),
      action(words.action, facts.orderUrl),
      terms(words.terms(facts.terms.version), facts.terms.text),
    ),
  }
}
