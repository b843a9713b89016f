import 'server-only'
import { log } from '@/lib/config/log'
import { clock } from '@/lib/gateways/clock'
import { listDue, markDone, markFailed } from '@/lib/jobs/list-due'
import type { Task } from '@/lib/jobs/task'
import { DUE_HANDLERS } from './due-kinds'

/** Doing one thing may make the next fall due at once, after a long jump of the clock; a bug must not loop for ever. */
const ROUNDS = 100

/**
 * Does everything that has fallen due by business time, oldest first. One that fails does not hold up the
 * others and stays due; the task then fails, so that it is seen and tried again.
 */
export const due: Task<'due'> = async () => {
  const failed = new Set<string>()
  for (let round = 0; round < ROUNDS; round += 1) {
    const now = await clock.now()
    const items = (await listDue(now)).filter((item) => !failed.has(`${item.kind} ${item.subjectId}`))
    if (items.length === 0) break
    for (const item of items) {
      try {
        await DUE_HANDLERS[item.kind](item, now)
        await markDone(item, now)
      } catch (error) {
        failed.add(`${item.kind} ${item.subjectId}`)
        await markFailed(item, error)
        log().error({ kind: item.kind, subject: item.subjectId, error }, 'due item failed')
      }
    }
  }
  if (failed.size > 0)
    throw new Error(`${failed.size} due items failed: ${[...failed].slice(0, 5).join(', ')}`)
}
