import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { YearQuery } from '@/lib/contracts/money-desk'
import { plainMoney } from '@/lib/core/money/plain'
import { refuse } from '@/lib/core/result'
import { csv } from '@/lib/http/csv'
import { route } from '@/lib/http/route'
import { moneyWords } from '@/lib/messages/money-desk'
import { getTaxReport } from '@/lib/queries/money/get-tax-report'

export const GET = route(
  { deed: 'tax:report', params: z.object({ workshop: slug }), query: YearQuery },
  async ({ actor, workshop, query, now }) => {
    const report = await getTaxReport({ actor, workshopId: workshop.id, year: query.year, now })
    if (!report) return refuse('not_found')
    const { currency, year } = report
    const money = (minor: number) => Number(plainMoney(minor, currency))
    return csv(
      moneyWords.taxColumns,
      report.rows.map((row) => [
        row.month,
        row.country,
        row.basisPoints / 100,
        money(row.netMinor),
        money(row.taxMinor),
        money(row.grossMinor),
        currency,
      ]),
      `tax-${workshop.slug}-${year}.csv`,
    )
  },
)
