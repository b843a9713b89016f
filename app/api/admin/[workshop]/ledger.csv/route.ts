import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { MonthQuery } from '@/lib/contracts/money-desk'
import { plainMoney } from '@/lib/core/money/plain'
import { refuse } from '@/lib/core/result'
import { csv } from '@/lib/http/csv'
import { route } from '@/lib/http/route'
import { moneyWords } from '@/lib/messages/money-desk'
import { listLedgerMonth } from '@/lib/queries/money/list-ledger-month'

export const GET = route(
  { deed: 'ledger:export', params: z.object({ workshop: slug }), query: MonthQuery },
  async ({ actor, workshop, query }) => {
    const lines = await listLedgerMonth({ actor, workshopId: workshop.id, month: query.month })
    if (!lines) return refuse('not_found')
    return csv(
      moneyWords.ledgerColumns,
      lines.map((line) => [
        line.at,
        line.transfer,
        line.kind,
        line.orderNumber ?? '',
        line.account,
        Number(plainMoney(line.amountMinor, line.currency)),
        line.currency,
      ]),
      `ledger-${workshop.slug}-${query.month}.csv`,
    )
  },
)
