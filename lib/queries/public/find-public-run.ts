import 'server-only'
import { QueryTypes } from 'sequelize'
import type { PageRun } from '@/lib/contracts/module-page'
import { daysBetween } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { sequelize } from '@/lib/db/sequelize'
import { Revision, Run, RunOffer, type Workshop } from '@/models'

/** After so many days without news from a locked run its page says so. */
const SILENT_DAYS = 30

/** Units of a run as the public counts them. */
export type PublicUnits = { deposited: number; held: number; waiting: number }

/** The newest run of a module that takes deposits or is locked, with its offers; never a draft. Null when there is none. One statement. */
export function findPublicRun(moduleId: string): Promise<Run | null> {
  return Run.findOne({
    where: { moduleId, state: ['taking_deposits', 'locked'] },
    include: [
      { model: RunOffer, as: 'offers', separate: true, order: [['priceMinor', 'ASC']] },
      { model: Revision, as: 'revision', attributes: ['letter'] },
    ],
    order: [['number', 'DESC']],
  })
}

/** Units under deposit, held while someone pays, and waiting, per run; orders entered by hand in none. One statement. */
export async function countUnits(runIds: readonly string[]): Promise<Map<string, PublicUnits>> {
  if (runIds.length === 0) return new Map()
  const rows = await sequelize.query<{ run: string } & PublicUnits>(
    `select run_id as run,
            coalesce(sum(unit_count) filter (where state in ('reserved', 'balance_due', 'paid', 'packed', 'posted')), 0)::int as deposited,
            coalesce(sum(unit_count) filter (where state = 'awaiting_deposit'), 0)::int as held,
            coalesce(sum(unit_count) filter (where state = 'waiting'), 0)::int as waiting
     from orders where run_id in (:runIds) and kind = 'paid' group by run_id`,
    { replacements: { runIds }, type: QueryTypes.SELECT },
  )
  return new Map(rows.map(({ run, ...units }) => [run, units]))
}

/** A run as its module's page tells it. */
export function toPageRun(run: Run, workshop: Workshop, units: PublicUnits | undefined, now: Date): PageRun {
  const today = dayIn(now, workshop.timeZone)
  const daysLeft = daysBetween(today, run.decideByOn)
  const isOpenToAll = run.opensToAllAt === null || run.opensToAllAt <= now
  return {
    id: run.id,
    state: run.state === 'locked' ? 'locked' : 'taking_deposits',
    minimum: run.minimum,
    maximum: run.maximum,
    deposited: units?.deposited ?? 0,
    held: units?.held ?? 0,
    waiting: units?.waiting ?? 0,
    decideBy: run.decideByOn,
    opensToAllAt: run.opensToAllAt?.toISOString() ?? null,
    offers: (run.offers ?? []).map(({ kind, priceMinor, depositMinor, postedByOn }) => ({
      offer: kind,
      priceMinor,
      depositMinor,
      postedBy: postedByOn,
    })),
    revision: run.revision?.letter ?? '',
    daysLeft,
    balanceWhen: run.balanceWhen,
    limitPerPerson: run.limitPerPerson,
    takesOrders: run.state === 'taking_deposits' && daysLeft >= 0 && workshop.state === 'open',
    isOpenToAll,
    isFull: run.committedUnits >= run.maximum,
    lockedOn: run.lockedAt && dayIn(run.lockedAt, workshop.timeZone),
    silentDays: silentDays(run, workshop.timeZone, today),
  }
}

function silentDays(run: Run, zone: string, today: string): number | null {
  if (run.state !== 'locked' || run.lockedAt === null) return null
  const heard = run.lastUpdateAt && run.lastUpdateAt > run.lockedAt ? run.lastUpdateAt : run.lockedAt
  const days = daysBetween(dayIn(heard, zone), today)
  return days >= SILENT_DAYS ? days : null
}
