import 'server-only'
import { balanceOf, book } from '@/lib/gateways/payments/fake/balance'
import {
  type Books,
  hiddenOf,
  insert,
  load,
  newId,
  save,
  withBooks,
} from '@/lib/gateways/payments/fake/books'
import { expireSession } from '@/lib/gateways/payments/fake/card-session'
import { cardOf } from '@/lib/gateways/payments/fake/cards'
import { moveDispute, openDispute } from '@/lib/gateways/payments/fake/dispute-money'
import { emit } from '@/lib/gateways/payments/fake/events'
import type { Kind } from '@/lib/gateways/payments/fake/kinds'
import { newPayout } from '@/lib/gateways/payments/fake/objects/after-payment'
import { sandboxPool } from '@/lib/gateways/payments/fake/pool'
import { moveRefund } from '@/lib/gateways/payments/fake/refund-money'

async function disputeCharge(books: Books, id: string): Promise<void> {
  const charge = await load(books, 'charge', id)
  const { number } = await hiddenOf(books, 'payment_method', charge.payment_method ?? '')
  const reason = cardOf(number)?.disputed
  // A charge paid back in full leaves nothing to dispute.
  if (reason === undefined || charge.disputed || charge.refunded)
    await save(books, 'charge', charge, { dueAt: null })
  else await openDispute(books, charge, reason)
}

async function arrivePayout(books: Books, id: string): Promise<void> {
  const payout = await save(
    books,
    'payout',
    { ...(await load(books, 'payout', id)), status: 'paid' },
    { dueAt: null },
  )
  await emit(books, 'payout.paid', payout)
}

async function move(books: Books, kind: Kind, id: string): Promise<void> {
  switch (kind) {
    case 'checkout_session':
      await expireSession(books, await load(books, kind, id))
      return
    case 'refund':
      return moveRefund(books, await load(books, kind, id))
    case 'dispute':
      return moveDispute(books, await load(books, kind, id))
    case 'charge':
      return disputeCharge(books, id)
    case 'payout':
      return arrivePayout(books, id)
  }
}

/** Pays out what is available, once a day, unless payouts are manual. */
async function payOut(books: Books): Promise<void> {
  const account = await load(books, 'account', books.account)
  const hidden = await hiddenOf(books, 'account', books.account)
  const today = new Date(books.now * 1000).toISOString().slice(0, 10)
  if (!account.payouts_enabled || hidden.interval === 'manual' || hidden.paidOutOn === today) return
  await save(books, 'account', account, { hidden: { ...hidden, paidOutOn: today } })
  for (const { currency, available } of await balanceOf(books)) {
    if (available <= 0) continue
    const id = await newId(books, 'payout')
    const booked = await book(books, { type: 'payout', amount: -available, currency, source: id })
    const payout = newPayout({ id, now: books.now, amount: available, currency, booked: booked.id })
    await insert(books, 'payout', payout, { hidden: {}, dueAt: payout.arrival_date })
    await emit(books, 'payout.created', payout)
  }
}

async function passFor(account: string): Promise<number> {
  return withBooks(account, async (books) => {
    const { rows } = await books.sql.query(
      'select id, kind from sandbox.objects where account = $1 and due_at <= $2 order by due_at, seq',
      [account, books.now],
    )
    for (const { id, kind } of rows) await move(books, kind, id)
    await payOut(books)
    return rows.length
  })
}

/**
 * Lets everything happen that business time has brought: sessions expire, refunds settle or fail, disputes open and
 * close, payouts go out and arrive. Answers how many objects moved.
 */
export async function passTime(): Promise<number> {
  const pool = await sandboxPool()
  const now = await withBooks('', async (books) => books.now)
  const { rows } = await pool.query(
    `select distinct account from sandbox.objects where due_at <= $1
     union
     select id from sandbox.objects where kind = 'account' and hidden->>'interval' = 'daily'
       and (body->>'payouts_enabled')::boolean
       and hidden->>'paidOutOn' <> to_char(to_timestamp($1) at time zone 'UTC', 'YYYY-MM-DD')`,
    [now],
  )
  let moved = 0
  for (const { account } of rows) moved += await passFor(account)
  return moved
}
