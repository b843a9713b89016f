import 'server-only'
import type { Transaction } from 'sequelize'
import type { MailLine } from '@/lib/contracts/mail-facts'
import type { Day } from '@/lib/core/brand'
import { crossesCustoms } from '@/lib/core/post/customs-territory'
import type { LockedParcel } from '@/lib/services/_steps/lock-parcel'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { Address, type ParcelLine, type PostageService, type Workshop } from '@/models'

/**
 * Promises the buyer the mail about a parcel that was handed over: what is in it, how it goes and how to follow it.
 * Locks: nothing. Writes: one outbox row. Repeat: safe, one mail per parcel.
 */
export async function mailHandOver(
  tx: Transaction,
  { order, parcel, lines }: LockedParcel,
  given: { service: PostageService | null; workshop: Workshop; today: Day; more: boolean; now: Date },
): Promise<void> {
  const { service, workshop, today, more, now } = given
  const { ofOrder, module } = await orderMailFacts(tx, order)
  const to = await Address.findByPk(parcel.addressId, { transaction: tx, rejectOnEmpty: true })
  const from = { country: workshop.country, postcode: workshop.postalAddress?.postcode }
  await queueMail(tx, {
    kind: 'parcel_handed_over',
    workshopId: order.workshopId,
    personId: parcel.personId,
    subjectId: parcel.id,
    props: {
      ...ofOrder,
      lines: mailLines(lines, module.name),
      service: parcel.serviceName ?? '',
      tracking: parcel.tracking,
      trackingUrl: trackingUrl(service, parcel.tracking),
      handedOverOn: today,
      more,
      isReplacement: parcel.problemId !== null,
      crossesCustoms: crossesCustoms(from, { country: to.country, postcode: to.postcode ?? undefined }),
      problemUrl: ofOrder.orderUrl,
    },
    now,
  })
}

/** Units of one line are one line again. */
function mailLines(lines: readonly ParcelLine[], module: string): MailLine[] {
  const found = new Map<string, MailLine>()
  for (const { orderLine, orderLineId, quantity } of lines) {
    const before = found.get(orderLineId)?.quantity ?? 0
    const choices = orderLine!.choices.map(({ question, label }) => ({ question, answer: label }))
    found.set(orderLineId, { module, offer: orderLine!.offerKind, quantity: before + quantity, choices })
  }
  return [...found.values()]
}

function trackingUrl(service: PostageService | null, tracking: string | null): string | null {
  if (!service?.trackingUrl || tracking === null) return null
  const url = service.trackingUrl.replace('{tracking}', encodeURIComponent(tracking))
  return URL.canParse(url) && /^https?:/.test(url) ? url : null
}
