import 'server-only'
import type { Day } from '@/lib/core/brand'
import type { RunDays } from '@/lib/core/costs/run-cash'
import { addWorkingDays } from '@/lib/core/promises/working-days'
import { addDays } from '@/lib/core/time/day'
import { finishOf } from './promise-of'
import type { RunFacts } from './run-facts'

/** Days from the lock to the bills of the suppliers, and from finished work to the last parcel. Our own values. */
const BILLS_AFTER = 7
const PACKING_DAYS = 7

/**
 * When a run's money is expected to move: bills a week after the lock, balances as the run says, work a week before the
 * expected finish of the schedule, postage at it. Without a schedule the latest promise stands for the finish.
 */
export function runDaysOf(facts: RunFacts): RunDays {
  const { run, today, offers } = facts
  const lockOn = run.lockedOn ?? run.decideByOn
  const finish = finishOf(facts)
  const promised = offers.map(({ postedByOn }) => postedByOn).sort()
  const mean = finish && (finish.exact ? finish.mean : finish.mean.high)
  const done =
    mean === null
      ? (promised.at(-1) ?? lockOn)
      : addWorkingDays(lockOn, Math.max(0, Math.ceil(mean)), facts.closedDays)
  const boughtOn = addDays(lockOn, BILLS_AFTER)
  const workedOn = latest(boughtOn, addDays(done, -PACKING_DAYS))
  return {
    spentOn: today < lockOn ? today : lockOn,
    lockOn,
    boughtOn,
    balancesOn: run.balanceWhen === 'at_lock' ? boughtOn : workedOn,
    workedOn,
    postedOn: latest(workedOn, done),
  }
}

const latest = (one: Day, other: Day): Day => (one > other ? one : other)
