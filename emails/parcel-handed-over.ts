import { action, blocks, link, para, rows, type Write } from '@/emails/_letter'
import { mailWords } from '@/lib/messages/mails'

const words = mailWords.parcelHandedOver

export const parcelHandedOver: Write<'parcel_handed_over'> = (facts, say) => {
  const lead = words.lead(say.day(facts.handedOverOn))
  return {
    subject: (facts.isReplacement ? words.subjectReplacement : words.subject)(facts.orderNumber),
    preview: lead,
    blocks: blocks(
      para(lead),
      rows(
        ...facts.lines.map((line) => ({
          label: `${line.module}, ${say.offer(line.offer)}`,
          value: `${line.quantity} ×`,
          ...(line.choices.length > 0 && {
            note: line.choices.map(({ question, answer }) => `${question}: ${answer}`).join('; '),
          }),
        })),
        { label: words.service, value: facts.service },
        { label: words.tracking, value: facts.tracking ?? words.noTracking },
      ),
      facts.trackingUrl !== null && action(words.follow, facts.trackingUrl),
      facts.more && para(words.more),
      facts.crossesCustoms && para(words.customs),
      para(words.problem),
      link(words.report, facts.problemUrl),
      link(mailWords.labels.orderPage, facts.orderUrl),
    ),
  }
}
