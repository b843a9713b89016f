import 'server-only'
import type { Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import { TODAY_KINDS, type TodayItem } from '@/lib/contracts/today'
import { ok } from '@/lib/core/result'
import { dayIn } from '@/lib/core/time/zone'
import { daysBetween } from '@/lib/core/time/day'
import { inTransaction } from '@/lib/db/in-transaction'
import { paths } from '@/lib/paths'
import { listTodayOf } from '@/lib/queries/today/list-today'
import { setDigestDue } from '@/lib/services/_steps/set-digest-due'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { todayHref } from '@/lib/services/_steps/today-href'
import { Membership, Run, Workshop } from '@/models'

/**
 * The evening's mail to the owners of a workshop: the list of their desk, counted. None on an evening on which nothing needs
 * them. Comes again the next evening as long as a run is going.
 * Locks: nothing. Writes: one mail per owner, the next due row. Repeat: safe; one mail per owner and day.
 */
export async function sendOwnerDigest(cmd: { workshopId: string; now: Date }) {
  const { workshopId, now } = cmd
  const items = await listTodayOf({ workshopId, now })
  return inTransaction(async (tx) => {
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, rejectOnEmpty: true })
    const going = await Run.count({
      where: { workshopId, state: ['taking_deposits', 'locked'] },
      transaction: tx,
    })
    if (going > 0) await setDigestDue(tx, workshop, now)
    if (items.length > 0) await write(tx, workshop, items, now)
    return ok({ items: items.length })
  })
}

async function write(tx: Transaction, workshop: Workshop, items: readonly TodayItem[], now: Date) {
  const owners = await Membership.findAll({
    where: { workshopId: workshop.id, role: 'owner', endedAt: null },
    transaction: tx,
  })
  const on = dayIn(now, workshop.timeZone)
  const site = env().BASE_URL
  const counted = TODAY_KINDS.flatMap((what) => {
    const own = items.filter((item) => item.what === what)
    const count = own.reduce((sum, item) => sum + item.count, 0)
    return own[0] ? [{ what, count, url: `${site}${todayHref(workshop.slug, own[0])}` }] : []
  })
  for (const { id, personId } of owners)
    await queueMail(tx, {
      kind: 'owner_digest',
      workshopId: workshop.id,
      personId,
      subjectId: id,
      version: daysBetween('1970-01-01', on),
      props: {
        on,
        deskUrl: `${site}${paths.admin(workshop.slug)}`,
        settingsUrl: `${site}${paths.adminSettings(workshop.slug)}`,
        items: counted,
      },
      now,
    })
}
