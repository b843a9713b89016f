import 'server-only'
import { QueryTypes } from 'sequelize'
import type { Movement } from '@/lib/core/ledger/reconcile'
import { sequelize } from '@/lib/db/sequelize'

export type BookedMovement = Movement & { at: Date }

/** What each transfer did to the money at the provider, with the provider's own name for what it is about. */
const BOOKED = `
  with moved as (
    select t.kind, t.source, t.at, e.currency, sum(e.amount_minor)::bigint as amount,
           case t.source when 'payment_attempt' then a.provider_id when 'refund' then r.provider_id
                         when 'payout' then t.source_id else p.provider_id end as object
    from ledger_transfers t
    join ledger_entries e on e.transfer_id = t.id and e.account = 'provider_balance'
    left join payment_attempts a on t.source = 'payment_attempt' and a.id::text = t.source_id
    left join refunds r on t.source = 'refund' and r.id::text = t.source_id
    left join disputes d on t.source = 'dispute' and d.id::text = t.source_id
    left join payment_attempts p on p.id = d.attempt_id
    where t.workshop_id = $workshopId group by t.id, e.currency, a.id, r.id, p.id)
  select * from moved where object = any($ids) or at >= $since order by at, kind, object`

type Row = { kind: string; source: string; at: Date; currency: string; amount: number; object: string | null }

/**
 * What the ledger says of the money at the provider: everything booked since an instant, and everything about the objects
 * named, whenever it was booked. Signs are those of the balance. One statement.
 */
export async function bookedMovements(asked: {
  workshopId: string
  since: Date
  ids: readonly string[]
}): Promise<BookedMovement[]> {
  const rows = await sequelize.query<Row>(BOOKED, {
    bind: { workshopId: asked.workshopId, since: asked.since.toISOString(), ids: [...asked.ids] },
    type: QueryTypes.SELECT,
  })
  return rows.map(({ object, amount, currency, at, ...row }) => ({
    id: object ?? 'the account',
    kind: kindOf(row),
    amount,
    currency,
    at,
  }))
}

function kindOf({ kind, source }: { kind: string; source: string }): Movement['kind'] {
  if (source === 'payout') return 'payout'
  if (kind === 'deposit_paid' || kind === 'balance_paid' || kind === 'change_paid') return 'charge'
  if (kind.startsWith('refund')) return 'refund'
  return kind.startsWith('dispute') ? 'dispute' : 'fee'
}
