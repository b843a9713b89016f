import 'server-only'
import type { Transaction } from 'sequelize'
import type { Reminder } from '@/lib/core/promises/reminders'
import { startOfDay } from '@/lib/core/time/zone'
import { setDue } from '@/lib/jobs/set-due'
import type { Run } from '@/models'

/** Reminders are written in the morning, in hours of the workshop's day. Our own value. */
const MORNING_HOURS = 9

/** Writes down when the owner of a run is reminded next. Locks: nothing. Writes: a due row. Repeat: safe; it moves. */
export async function setReminderDue(
  tx: Transaction,
  run: Run,
  zone: string,
  reminders: readonly Reminder[],
  now: Date,
): Promise<void> {
  const at = reminders
    .map(({ day }) => new Date(startOfDay(day, zone).getTime() + MORNING_HOURS * 3_600_000))
    .find((instant) => instant > now)
  if (at) await setDue(tx, { kind: 'run_reminder', subjectId: run.id, workshopId: run.workshopId, at })
}
