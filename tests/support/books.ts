import { QueryTypes } from 'sequelize'
import { reconcile, type Movement } from '@/lib/core/ledger/reconcile'
import { sequelize } from '@/lib/db/sequelize'
import { clock } from '@/lib/gateways/clock'
import { payments } from '@/lib/gateways/payments'
import { Workshop } from '@/models'

/** What is wrong with the books, in words; empty when the ledger balances and says what the provider's lists say. */
export type Compared = { wrong: string[]; charges: number; refunds: number; fees: number; disputes: number }

type Booked = { kind: string; object: string | null; currency: string; amount: number }

/** What each transfer did to the money at the provider, with the provider's own name for what it is about. */
const BOOKED = `
  select t.kind, e.currency, sum(e.amount_minor)::int8 as amount,
         case t.source when 'payment_attempt' then a.provider_id when 'refund' then r.provider_id
                       else p.provider_id end as object
  from ledger_transfers t
  join ledger_entries e on e.transfer_id = t.id and e.account = 'provider_balance'
  left join payment_attempts a on t.source = 'payment_attempt' and a.id::text = t.source_id
  left join refunds r on t.source = 'refund' and r.id::text = t.source_id
  left join disputes d on t.source = 'dispute' and d.id::text = t.source_id
  left join payment_attempts p on p.id = d.attempt_id
  where t.workshop_id = $workshopId group by t.id, e.currency, a.id, r.id, p.id order by t.at, t.id`

/** The ledger of every workshop, or of those given, against the provider's lists, read through the SDK alone. */
export async function compareBooks(only?: readonly Workshop[]): Promise<Compared> {
  const found: Compared = { wrong: [], charges: 0, refunds: 0, fees: 0, disputes: 0 }
  const unbalanced = await sequelize.query<{ id: string }>(
    `select transfer_id as id from ledger_entries group by transfer_id, currency having sum(amount_minor) <> 0`,
    { type: QueryTypes.SELECT },
  )
  found.wrong.push(...unbalanced.map(({ id }) => `the transfer ${id} does not balance`))
  for (const workshop of only ?? (await Workshop.findAll())) {
    if (workshop.providerAccountId) await compareOne(workshop.id, workshop.providerAccountId, found)
  }
  return found
}

async function compareOne(workshopId: string, account: string, found: Compared): Promise<void> {
  const booked = await sequelize.query<Booked>(BOOKED, { bind: { workshopId }, type: QueryTypes.SELECT })
  const window = { account, from: new Date(0), to: new Date((await clock.now()).getTime() + 60_000) }
  const provider = payments()
  const [charges, refunds, fees, disputes] = await Promise.all([
    provider.listCharges(window),
    provider.listRefunds(window),
    provider.listFees(window),
    provider.listDisputes(window),
  ])
  if (!charges.ok || !refunds.ok || !fees.ok || !disputes.ok)
    throw new Error(`the provider's lists of ${account} cannot be read`)
  const theirs = [
    ...charges.value.map((line) => movement('charge', line.payment, line)),
    ...refunds.value.map((line) => movement('refund', line.id, { ...line, amount: -line.amount })),
    ...fees.value.map((line) => movement('fee', line.payment, { ...line, amount: -line.amount })),
    ...disputes.value.map((line) => movement('dispute', line.payment, { ...line, amount: -line.amount })),
  ]
  const ours = booked.map((each) => movement(kindOf(each), each.object, each))
  const differences = reconcile(netted(ours), netted(theirs))
  found.wrong.push(...differences.map((each) => `${account}: ${JSON.stringify(each)}`))
  found.charges += charges.value.length
  found.refunds += refunds.value.length
  found.fees += fees.value.length
  found.disputes += disputes.value.length
}

type Sum = { amount: number; currency: string }

const movement = (kind: Movement['kind'], id: string | null, { amount, currency }: Sum): Movement => ({
  kind,
  id: id ?? 'the account',
  amount,
  currency,
})

function kindOf({ kind }: Booked): Movement['kind'] {
  if (kind === 'deposit_paid' || kind === 'balance_paid' || kind === 'change_paid') return 'charge'
  if (kind.startsWith('refund')) return 'refund'
  return kind.startsWith('dispute') ? 'dispute' : 'fee'
}

/**
 * One sum per kind and thing: a refund that failed was booked there and back, and the fee of a dispute stands with its
 * sum in one transfer of ours and in two lines of theirs, so that fees and disputes of a payment are one sum.
 */
function netted(movements: readonly Movement[]): Movement[] {
  const sums = new Map<string, Movement>()
  for (const each of movements) {
    const kind = each.kind === 'dispute' ? 'fee' : each.kind
    const key = `${kind} ${each.id} ${each.currency}`
    sums.set(key, { ...each, kind, amount: (sums.get(key)?.amount ?? 0) + each.amount })
  }
  return [...sums.values()].filter(({ amount }) => amount !== 0)
}
