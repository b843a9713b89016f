import 'server-only'
import { QueryTypes } from 'sequelize'
import type { ModuleCard } from '@/lib/contracts/module-page'
import type { Day } from '@/lib/core/brand'
import { daysBetween } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { sequelize } from '@/lib/db/sequelize'
import { countUnits } from './find-public-run'

/** More than fit on a page are reached by their workshops. */
const MOST = 60

type Row = Omit<ModuleCard, 'workshop' | 'run'> & {
  workshop: string
  workshopName: string
  timeZone: string
  runId: string | null
  runState: 'taking_deposits' | 'locked' | null
  minimum: number
  maximum: number
  decideBy: Day
}

/** Published modules of open workshops, or of one workshop, those taking deposits first. Two statements. */
export async function listModuleCards(cmd: { workshopId?: string; now: Date }): Promise<ModuleCard[]> {
  const rows = await sequelize.query<Row>(
    `select w.slug as workshop, w.name as "workshopName", w.time_zone as "timeZone", m.slug, m.name,
            m.one_line as "oneLine", m.width_hp as "widthHp", m.controls, r.id as "runId", r.state as "runState",
            r.minimum, r.maximum, r.decide_by_on::text as "decideBy"
     from modules m
     join workshops w on w.id = m.workshop_id
     left join lateral (
       select id, state, minimum, maximum, decide_by_on from runs
       where module_id = m.id and state in ('taking_deposits', 'locked') order by number desc limit 1
     ) r on true
     where m.state = 'published'
       and ${cmd.workshopId ? 'w.id = :workshopId' : "w.state = 'open'"}
     order by r.state = 'taking_deposits' desc nulls last, m.published_at desc, m.id
     limit :most`,
    { replacements: { workshopId: cmd.workshopId ?? null, most: MOST }, type: QueryTypes.SELECT },
  )
  const units = await countUnits(rows.flatMap(({ runId }) => runId ?? []))
  return rows.map((row) => toCard(row, units.get(row.runId ?? '')?.deposited ?? 0, cmd.now))
}

function toCard(row: Row, deposited: number, now: Date): ModuleCard {
  const { slug, name, oneLine, widthHp, controls, minimum, maximum, decideBy } = row
  const daysLeft = row.runState ? daysBetween(dayIn(now, row.timeZone), decideBy) : 0
  return {
    workshop: { slug: row.workshop, name: row.workshopName },
    slug,
    name,
    oneLine,
    widthHp,
    controls,
    run: row.runState && { state: row.runState, deposited, minimum, maximum, decideBy, daysLeft },
  }
}
