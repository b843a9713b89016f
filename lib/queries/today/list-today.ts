import 'server-only'
import { TODAY_KINDS, type TodayItem } from '@/lib/contracts/today'
import { callOffDueOn } from '@/lib/core/states/run-changes'
import { can, type Actor } from '@/lib/core/policy/can'
import { addDays } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { Workshop } from '@/models'
import { readCounts, readRunsOpen } from './read-counts'
import { readPromises } from './read-promises'
import { silenceOf } from './silence-of'

/** How long before a decide-by or posted-by day it stands on the desk. Our own values. */
const DECIDE_AHEAD_DAYS = 14
const POSTED_AHEAD_DAYS = 14

/**
 * What needs the owner of a workshop today, most pressing first; empty for whoever may not see it. Five statements, whatever
 * there is.
 */
export async function listToday(cmd: { actor: Actor; workshopId: string; now: Date }): Promise<TodayItem[]> {
  return can(cmd.actor, 'workshop:read', { workshopId: cmd.workshopId }) ? listTodayOf(cmd) : []
}

/** The same without a reader, for the evening's mail. */
export async function listTodayOf({
  workshopId,
  now,
}: {
  workshopId: string
  now: Date
}): Promise<TodayItem[]> {
  const workshop = await Workshop.findByPk(workshopId, { rejectOnEmpty: true })
  const today = dayIn(now, workshop.timeZone)
  const items: TodayItem[] = []
  for (const { decideBy, deposited, minimum, ...run } of await readRunsOpen(workshopId)) {
    const of = { count: 1 as const, run, deposited, minimum }
    if (deposited >= minimum) items.push({ what: 'ready_to_lock', ...of })
    if (decideBy <= addDays(today, DECIDE_AHEAD_DAYS))
      items.push({ what: 'decide_soon', decideBy, callsOffOn: callOffDueOn(decideBy), ...of })
  }
  const promises = await readPromises(workshopId, addDays(today, POSTED_AHEAD_DAYS))
  for (const { run, postedBy, byCountry } of promises)
    items.push({
      what: 'notices_due',
      count: byCountry.reduce((sum, { orders }) => sum + orders, 0),
      ...{ run, postedBy },
      silence: silenceOf(byCountry, { postedBy, today, holidays: workshop.closedDays }),
    })
  items.push(...(await readCounts(workshopId, today)))
  const rank = ({ what }: TodayItem) => TODAY_KINDS.indexOf(what)
  return items.sort((a, b) => rank(a) - rank(b))
}
