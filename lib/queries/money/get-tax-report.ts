import 'server-only'
import { QueryTypes } from 'sequelize'
import type { TaxReport, TaxReportRow } from '@/lib/contracts/money-desk'
import { can, type Actor } from '@/lib/core/policy/can'
import { dayIn } from '@/lib/core/time/zone'
import { sequelize } from '@/lib/db/sequelize'
import { Workshop } from '@/models'

/** Credit notes take off; what is taxed at the posting only is not counted before. */
const LINES = `
  select to_char(i.issued_on, 'YYYY-MM') as month, i.tax_country as country,
         (l->>'taxBasisPoints')::int as "basisPoints",
         sum(s.sign * ((l->>'grossMinor')::bigint - (l->>'taxMinor')::bigint))::bigint as "netMinor",
         sum(s.sign * (l->>'taxMinor')::bigint)::bigint as "taxMinor",
         sum(s.sign * (l->>'grossMinor')::bigint)::bigint as "grossMinor"
  from invoices i cross join lateral jsonb_array_elements(i.lines) l
  cross join lateral (select case when i.kind = 'credit_note' then -1 else 1 end as sign) s
  where i.workshop_id = $workshopId and i.issued_on between $from and $to
    and coalesce((l->>'isTaxedLater')::boolean, false) = false
  group by 1, 2, 3 having bool_or((l->>'grossMinor')::bigint <> 0)
  order by 1, 2, 3 desc`

/**
 * The tax of a year by month, country and rate, from the workshop's numbered papers: what fell due, less what credit notes
 * took back. Null for who may not see it. Three statements.
 */
export async function getTaxReport(asked: {
  actor: Actor
  workshopId: string
  year?: string | undefined
  now: Date
}): Promise<TaxReport | null> {
  const { actor, workshopId } = asked
  if (!can(actor, 'tax:report', { workshopId })) return null
  const workshop = await Workshop.findByPk(workshopId)
  if (!workshop) return null
  const thisYear = dayIn(asked.now, workshop.timeZone).slice(0, 4)
  const year = asked.year ?? thisYear
  const rows = await sequelize.query<TaxReportRow>(LINES, {
    bind: { workshopId, from: `${year}-01-01`, to: `${year}-12-31` },
    type: QueryTypes.SELECT,
  })
  const years = await sequelize.query<{ year: string }>(
    `select distinct to_char(issued_on, 'YYYY') as year from invoices where workshop_id = $workshopId`,
    { bind: { workshopId }, type: QueryTypes.SELECT },
  )
  const all = [...new Set([thisYear, year, ...years.map((each) => each.year)])].sort().reverse()
  return { year, years: all, currency: workshop.currency, isTaxedOnArrival: workshop.depositsTaxed, rows }
}
