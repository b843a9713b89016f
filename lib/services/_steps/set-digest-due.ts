import 'server-only'
import type { Transaction } from 'sequelize'
import { addDays } from '@/lib/core/time/day'
import { dayIn, startOfDay } from '@/lib/core/time/zone'
import { setDue } from '@/lib/jobs/set-due'
import type { Workshop } from '@/models'

/** When the evening's mail is written, in hours of the workshop's day. Our own value. */
const EVENING_HOURS = 18

/** Writes down that the owners hear on the next evening. Locks: nothing. Writes: a due row. Repeat: safe; it moves. */
export async function setDigestDue(tx: Transaction, workshop: Workshop, now: Date): Promise<void> {
  const today = dayIn(now, workshop.timeZone)
  const eveningOf = (day: string) =>
    new Date(startOfDay(day, workshop.timeZone).getTime() + EVENING_HOURS * 3_600_000)
  const at = eveningOf(today) > now ? eveningOf(today) : eveningOf(addDays(today, 1))
  await setDue(tx, { kind: 'owner_digest', subjectId: workshop.id, workshopId: workshop.id, at })
}
