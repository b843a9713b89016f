import 'server-only'
import type { Transaction } from 'sequelize'
import { dropDue, setDue } from '@/lib/jobs/set-due'
import type { Order } from '@/models'

const DAY_MS = 86_400_000
/** Days after a failed charge on which the buyer is reminded. Source: product.md, Balances. */
export const REMINDER_DAYS = [3, 7, 12] as const

/**
 * Sets what follows when a balance could not be charged: the first reminder, and the lapse.
 * The caller has locked the order. Writes: due rows. Repeat: safe; it would start them anew.
 */
export async function setBalanceDues(
  tx: Transaction,
  given: { order: Order; failedAt: Date; lapseAfterDays: number },
): Promise<void> {
  const { id: subjectId, workshopId } = given.order
  const daysLater = (days: number) => new Date(given.failedAt.getTime() + days * DAY_MS)
  await setDue(tx, { kind: 'balance_reminder', subjectId, workshopId, at: daysLater(REMINDER_DAYS[0]) })
  await setDue(tx, { kind: 'order_lapse', subjectId, workshopId, at: daysLater(given.lapseAfterDays) })
}

/** Takes off everything that would still chase a balance: it is paid, or the order has ended. */
export async function dropBalanceDues(tx: Transaction, orderId: string): Promise<void> {
  for (const kind of ['balance_charge', 'balance_reminder', 'order_lapse'] as const)
    await dropDue(tx, kind, orderId)
}
