import { hasWithdrawalRight, withdrawalEnds } from '@/lib/core/promises/withdrawal'
import { dayIn } from '@/lib/core/time/zone'
import type { Order, Workshop } from '@/models'

/** Whether a buyer may withdraw by law, and until when; `endsOn` null while the last piece has not arrived. */
export function withdrawalOf(
  order: Pick<Order, 'country' | 'deliveredAt'>,
  workshop: Pick<Workshop, 'timeZone'>,
): { hasRight: boolean; endsOn: string | null } {
  const { country, deliveredAt } = order
  const hasRight = hasWithdrawalRight(country)
  if (!hasRight || deliveredAt === null) return { hasRight, endsOn: null }
  const lastDeliveredOn = dayIn(deliveredAt, workshop.timeZone)
  return { hasRight, endsOn: withdrawalEnds({ country, lastDeliveredOn, holidays: [] }) }
}
