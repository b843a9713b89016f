import 'server-only'
import { QueryTypes } from 'sequelize'
import type { TodayItem } from '@/lib/contracts/today'
import type { Day } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'

type OpenRun = {
  id: string
  number: number
  module: string
  slug: string
  decideBy: Day
  minimum: number
  deposited: number
}

/** A workshop's runs that take deposits, soonest decision first; one statement. */
export function readRunsOpen(workshopId: string): Promise<OpenRun[]> {
  return sequelize.query<OpenRun>(
    `select r.id, r.number, m.name as module, m.slug, r.decide_by_on::text as "decideBy", r.minimum,
            coalesce((select sum(o.unit_count) from orders o where o.run_id = r.id and o.kind = 'paid'
                      and o.state = 'reserved'), 0)::int as deposited
     from runs r join modules m on m.id = r.module_id
     where r.workshop_id = $workshopId and r.state = 'taking_deposits' order by r.decide_by_on, r.id`,
    { bind: { workshopId }, type: QueryTypes.SELECT },
  )
}

type CountedKind = Exclude<TodayItem['what'], 'decide_soon' | 'ready_to_lock' | 'notices_due'>
type Row = {
  what: CountedKind
  count: number
  id: string | null
  number: number
  module: string
  slug: string
}

/** Everything that is counted per run or per workshop, in one statement; nothing where the count is 0. */
const COUNTS = `
  with counted as (
    select 'balances_failed' as what, o.run_id, count(*) as count from orders o
    where o.workshop_id = $workshopId and o.state = 'balance_due' and o.balance_failed_at is not null group by 2
    union all
    select 'disputes', o.run_id, count(*) from disputes d join orders o on o.id = d.order_id
    where o.workshop_id = $workshopId and d.state = 'open' group by 2
    union all
    select 'problems_open', o.run_id, count(*) from problems p join orders o on o.id = p.order_id
    where p.workshop_id = $workshopId and p.state = 'open' group by 2
    union all
    select 'refunds_waiting', o.run_id, count(*) from refunds f join orders o on o.id = f.order_id
    where f.workshop_id = $workshopId and (f.short_by_minor is not null and f.state = 'requested'
      or f.state = 'failed' and not exists (select 1 from refunds n where n.retry_of_id = f.id)) group by 2
    union all
    select 'quotes_old', r.id, count(distinct l.part_id) from runs r join revision_lines l on l.revision_id = r.revision_id
    where r.workshop_id = $workshopId and r.state in ('draft', 'taking_deposits')
      and not exists (select 1 from quotes q where q.part_id = l.part_id and q.quoted_on > $today::date - 30) group by 2
    union all
    select 'parts_late', p.run_id, count(*) from purchase_lines p
    where p.workshop_id = $workshopId and p.run_id is not null and p.state in ('ordered', 'part_received')
      and p.due_on < $today::date group by 2
    union all
    select 'mails_bounced', null, count(*) from mail_outbox b
    where b.workshop_id = $workshopId and b.state = 'bounced' and b.ended_at > $today::date - 30
    union all
    select 'parcels_ready', null, count(*) from parcels c
    where c.workshop_id = $workshopId and c.state = 'open'
  )
  select c.what, c.count::int, r.id, r.number, m.name as module, m.slug
  from counted c left join runs r on r.id = c.run_id left join modules m on m.id = r.module_id
  where c.count > 0 order by c.what, r.decide_by_on, r.id`

/** Counts of what needs the owner, per run where it is about one. */
export async function readCounts(workshopId: string, today: Day): Promise<TodayItem[]> {
  const rows = await sequelize.query<Row>(COUNTS, { bind: { workshopId, today }, type: QueryTypes.SELECT })
  return rows.map(({ what, count, id, number, module, slug }) =>
    what === 'mails_bounced' || what === 'parcels_ready'
      ? { what, count, run: null }
      : { what, count, run: { id: id!, number, module, slug } },
  )
}
