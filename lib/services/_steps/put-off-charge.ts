import 'server-only'
import type { Transaction } from 'sequelize'
import { setDue } from '@/lib/jobs/set-due'
import type { Order } from '@/models'

/** Reasons for which a balance was not even tried: they pass, and the day comes again. */
export const PUT_OFF: readonly string[] = ['disputed', 'workshop_suspended', 'cannot_charge']

/**
 * Has a balance that may not be charged now fall due again a day later.
 * The caller has locked the order. Writes: a due row. Repeat: safe.
 */
export async function putOffCharge(tx: Transaction, order: Order, now: Date): Promise<void> {
  const { id: subjectId, workshopId } = order
  const at = new Date(now.getTime() + 86_400_000)
  await setDue(tx, { kind: 'balance_charge', subjectId, workshopId, at })
}
