import 'server-only'
import { setTimeout as pause } from 'node:timers/promises'
import { env } from '@/lib/config/env'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { clock } from '@/lib/gateways/clock'
import { waitingEvents } from '@/lib/gateways/payments/fake/deliver'
import { passTime } from '@/lib/gateways/payments/fake/pass-time'
import { enqueue } from '@/lib/jobs/enqueue'
import { countWaiting } from '@/lib/queries/sandbox/count-waiting'

const LOOK_EVERY_MS = 100
const LONGEST_MS = 120_000
/** Quiet for so many looks running counts as done: one job may be between its end and what it promised. */
const QUIET_LOOKS = 3
/** What is still due after so many runs of the due task is held up by something else, and is said in the log. */
const MOST_ASKED = 3

/**
 * Lets business time pass and comes back once everything that fell due has been done: the provider's own time, its
 * events, due rows, jobs, mails. The worker and the sandbox's provider do the work; this only asks and waits.
 * Refuses: not_found outside the sandbox · busy (not quiet within two minutes; the clock has moved all the same).
 * Writes: the clock, a job. Repeat: advances again.
 */
export async function advanceClock({ hours }: { hours: number }) {
  if (!env().SANDBOX) return refuse('not_found')
  await clock.advance(hours)
  const began = performance.now()
  await passTime()
  await askForDue()
  let quiet = 0
  let stuck = { due: 0, asked: 0 }
  for (;;) {
    const left = await countWaiting(await clock.now())
    const events = await waitingEvents()
    const isBusy = left.jobs > 0 || left.mails > 0 || events.waiting > 0
    if (!isBusy && left.due > 0) {
      stuck = left.due === stuck.due ? { ...stuck, asked: stuck.asked + 1 } : { due: left.due, asked: 1 }
      if (stuck.asked <= MOST_ASKED) await askForDue()
    }
    const isQuiet = !isBusy && (left.due === 0 || stuck.asked > MOST_ASKED)
    quiet = isQuiet ? quiet + 1 : 0
    if (quiet >= QUIET_LOOKS) return ok({ now: (await clock.now()).toISOString() })
    if (performance.now() - began > LONGEST_MS) return refuse('busy')
    await pause(LOOK_EVERY_MS)
  }
}

async function askForDue(): Promise<void> {
  await inTransaction(async (tx) => {
    await enqueue(tx, 'due', {}, { key: 'due', queue: 'due', maxAttempts: 1 })
    return ok({})
  })
}
