import 'server-only'
import { minor } from '@/lib/core/brand'
import { netted } from '@/lib/core/ledger/netted'
import { reconcile, type Difference, type Movement } from '@/lib/core/ledger/reconcile'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { payments } from '@/lib/gateways/payments'
import type { BookLine } from '@/lib/gateways/payments/types'
import { setDue } from '@/lib/jobs/set-due'
import { bookedMovements, type BookedMovement } from '@/lib/queries/money/booked-movements'
import { catchUpDisputes } from '@/lib/services/_steps/catch-up-disputes'
import { recordPayout } from '@/lib/services/_steps/record-payout'
import { ProviderEvent, Reconciliation, Workshop } from '@/models'
import type { ReconciliationDifference } from '@/models/json'
import { Op } from 'sequelize'

const DAY_MS = 86_400_000
/** How far back each day's comparison looks; own rule: longer than any event, look-up or refund is under way. */
const LOOK_BACK_MS = 40 * DAY_MS
/** What is younger may still be on its way to us. */
const SETTLED_MS = 3_600_000
/** Source: data.md, people apart: what an event says of a person is not kept longer than it can be needed. */
const PAYLOAD_KEPT_MS = 90 * DAY_MS

type Compared = { day: string; items: number; differences: ReconciliationDifference[] }

/**
 * Compares a workshop's books with the payment provider's own lists of charges, refunds, disputes, fees and payouts, read
 * through the SDK to their last page, and keeps the result of the day. Disputes and payouts whose events were lost are
 * written down first. Texts of events older than 90 days are cut. Sets itself due for the next day.
 * Refuses: not_found · cannot_charge (no account) · provider_unreachable (comes again). Locks: the orders of disputes.
 * Writes: disputes, payouts, the day's result, event texts, a due row. Repeat: safe; the day's result is replaced.
 */
export async function compareBooks(cmd: {
  /** Absent: the clock ordered it. */
  actor?: Actor
  workshopId: string
  now: Date
}): Promise<Result<Compared, 'not_found' | 'cannot_charge' | 'provider_unreachable'>> {
  const { actor, workshopId, now } = cmd
  if (actor && !can(actor, 'ledger:reconcile', { workshopId })) return refuse('not_found')
  const workshop = await Workshop.findByPk(workshopId)
  if (!workshop) return refuse('not_found')
  const account = workshop.providerAccountId
  if (account === null) return refuse('cannot_charge')
  const window = { account, from: new Date(now.getTime() - LOOK_BACK_MS), to: now }
  if (!(await catchUpDisputes(workshop.id, window, now))) return refuse('provider_unreachable')
  const lines = await listAll(window)
  if (lines === null) return refuse('provider_unreachable')
  for (const { id, amount, currency } of lines.filter(({ kind }) => kind === 'payout'))
    await recordPayout(account, { payout: id, state: 'pending', amount, currency }, now)

  const theirs = lines.map(toMovement)
  const ids = [...new Set(theirs.map(({ id }) => id))]
  const booked = await bookedMovements({ workshopId, since: window.from, ids })
  const { ours, listed } = comparable(booked, theirs, lines, window.from, now)
  const found = reconcile(ours, listed).map((each) => withCurrency(each, ours, listed))
  return store(workshop, { items: listed.length, differences: found }, now)
}

async function listAll(window: { account: string; from: Date; to: Date }): Promise<BookLine[] | null> {
  const provider = payments()
  const lists = [
    await provider.listCharges(window),
    await provider.listRefunds(window),
    await provider.listDisputes(window),
    await provider.listFees(window),
    await provider.listPayouts(window),
  ]
  const lines: BookLine[] = []
  for (const list of lists) {
    if (!list.ok) return null
    lines.push(...list.value)
  }
  return lines
}

/** A fee stands beside the charge of the same payment: an id of its own keeps the two apart in what is found. */
const marked = (movement: Movement): Movement =>
  movement.kind === 'fee' ? { ...movement, id: `${FEE_OF}${movement.id}` } : movement
const FEE_OF = 'fee of '

/** Fees and disputes belong to their payment, as in our books; what goes out is negative, as in the balance. */
function toMovement({ id, kind, amount, currency, payment }: BookLine): Movement {
  const isPayments = kind === 'charge' || kind === 'fee' || kind === 'dispute'
  const sign = kind === 'charge' ? 1 : -1
  return { id: isPayments ? (payment ?? 'the account') : id, kind, amount: minor(sign * amount), currency }
}

/**
 * What can be held against each other: nothing younger than an hour on either side alone, and of what we booked only what
 * the provider's window must list.
 */
function comparable(
  booked: readonly BookedMovement[],
  theirs: readonly Movement[],
  lines: readonly BookLine[],
  from: Date,
  now: Date,
): { ours: Movement[]; listed: Movement[] } {
  const keyOf = ({ kind, id }: Movement) => `${kind === 'dispute' ? 'fee' : kind} ${id}`
  const isListed = new Set(theirs.map(keyOf))
  const isBooked = new Set(booked.map(keyOf))
  const settled = now.getTime() - SETTLED_MS
  const first = from.getTime() + DAY_MS
  const ours = booked.filter(
    (each) => isListed.has(keyOf(each)) || (each.at.getTime() >= first && each.at.getTime() <= settled),
  )
  const listed = theirs.filter(
    (each, i) => isBooked.has(keyOf(each)) || (lines[i]?.at.getTime() ?? 0) <= settled,
  )
  const own = ours.map(({ at: _, ...movement }) => movement)
  return { ours: netted(own).map(marked), listed: netted(listed).map(marked) }
}

function withCurrency(
  { kind, id }: Difference,
  ours: readonly Movement[],
  theirs: readonly Movement[],
): ReconciliationDifference {
  const sumIn = (list: readonly Movement[]) => {
    const own = list.find((each) => each.id === id)
    return own ? { amount: own.amount, currency: own.currency } : null
  }
  return {
    kind,
    isFee: id.startsWith(FEE_OF),
    id: id.replace(FEE_OF, ''),
    ours: kind === 'missing_here' ? null : sumIn(ours),
    theirs: kind === 'missing_there' ? null : sumIn(theirs),
  }
}

async function store(
  workshop: Workshop,
  { items, differences }: { items: number; differences: ReconciliationDifference[] },
  now: Date,
) {
  const day = dayIn(now, workshop.timeZone)
  const { id: workshopId, providerAccountId: account } = workshop
  return inTransaction(async (tx) => {
    const row = { workshopId, day, comparedAt: now, itemCount: items, differences }
    const [known, isNew] = await Reconciliation.findOrCreate({
      where: { workshopId, day },
      defaults: row,
      transaction: tx,
    })
    if (!isNew) await known.update(row, { transaction: tx })
    await ProviderEvent.update(
      { payload: null, payloadCutAt: now },
      {
        where: {
          account: account ?? '',
          payload: { [Op.ne]: null },
          appliedAt: { [Op.ne]: null },
          providerCreatedAt: { [Op.lt]: new Date(now.getTime() - PAYLOAD_KEPT_MS) },
        },
        transaction: tx,
      },
    )
    const at = new Date(now.getTime() + DAY_MS)
    await setDue(tx, { kind: 'compare_books', subjectId: workshopId, workshopId, at })
    return ok({ day, items, differences })
  })
}
