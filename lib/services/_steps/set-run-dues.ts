import 'server-only'
import type { Transaction } from 'sequelize'
import { remindersOf } from '@/lib/core/promises/reminders'
import { callOffDueOn } from '@/lib/core/states/run-changes'
import { addDays } from '@/lib/core/time/day'
import { dayIn, startOfDay } from '@/lib/core/time/zone'
import { dropDue, setDue } from '@/lib/jobs/set-due'
import { setForecastDue } from '@/lib/services/_steps/set-forecast-due'
import { setReminderDue } from '@/lib/services/_steps/set-reminder-due'
import { type Run, RunOffer } from '@/models'

/** When the clock calls an undecided run off: as the seventh day after decide-by begins in the workshop's zone. */
export const callOffAt = (run: Run, zone: string) => startOfDay(callOffDueOn(run.decideByOn), zone)

/**
 * When a run's public page says something else without anybody's doing: as everyone may order, and each midnight, since
 * days left and days of silence are counted on it.
 */
export function pageTurnsAt(run: Run, zone: string, now: Date): Date {
  const midnight = startOfDay(addDays(dayIn(now, zone), 1), zone)
  const opens = run.opensToAllAt
  return opens !== null && opens > now && opens < midnight ? opens : midnight
}

/**
 * Writes down what the clock does with a run that takes deposits.
 * Locks: nothing. Writes: due rows. Repeat: safe; they move.
 */
export async function setRunDues(tx: Transaction, run: Run, zone: string, now: Date): Promise<void> {
  const about = { subjectId: run.id, workshopId: run.workshopId }
  await setDue(tx, { kind: 'decide_by_passed', ...about, at: callOffAt(run, zone) })
  await setDue(tx, { kind: 'run_page', ...about, at: pageTurnsAt(run, zone, now) })
  await setForecastDue(tx, run, now)
  const offers = await RunOffer.findAll({ where: { runId: run.id }, transaction: tx })
  const postedBy = offers.map(({ kind, postedByOn }) => ({ offer: kind, on: postedByOn }))
  await setReminderDue(tx, run, zone, remindersOf({ decideBy: run.decideByOn, postedBy }), now)
}

/**
 * Takes off what the clock would do with a run that is decided. While it is being built its page still turns, and its owner is
 * still reminded of its promises.
 */
export async function dropRunDues(tx: Transaction, run: Run): Promise<void> {
  await dropDue(tx, 'decide_by_passed', run.id)
  await dropDue(tx, 'run_forecast', run.id)
  if (run.state !== 'locked') await dropDue(tx, 'run_reminder', run.id)
  if (run.state !== 'locked') await dropDue(tx, 'run_page', run.id)
}
