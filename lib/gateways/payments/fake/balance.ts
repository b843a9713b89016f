import 'server-only'
import type Stripe from 'stripe'
import { type Books, insert, newId } from '@/lib/gateways/payments/fake/books'

type Booking = {
  type: Stripe.BalanceTransaction.Type
  amount: number
  currency: string
  source: string
  fee?: number
  availableOn?: number
  description?: string
}

const THREE_DECIMALS = ['bhd', 'jod', 'kwd', 'omr', 'tnd']

/**
 * What the fake keeps of a charge, in the provider's units: 1.5 % and a fixed part of about 0.25 €.
 * Own rule, the size of published European prices; real fees depend on country, card and contract.
 */
export function chargeFee(amount: number, currency: string): number {
  if (THREE_DECIMALS.includes(currency)) return Math.round((amount * 150) / 100_000) * 10 + 80
  const fixed: Record<string, number> = { jpy: 0, gbp: 20, usd: 30, eur: 25 }
  return Math.floor((amount * 150 + 5_000) / 10_000) + (fixed[currency] ?? 25)
}

/** What a dispute costs, won or lost. Own rule: about 20 €. */
export function disputeFee(currency: string): number {
  if (currency === 'jpy') return 2_500
  return THREE_DECIMALS.includes(currency) ? 6_500 : 2_000
}

/** Books a movement of the account's balance; every object that moves money has one. */
export async function book(books: Books, booking: Booking): Promise<Stripe.BalanceTransaction> {
  const { type, amount, currency, source, fee = 0, availableOn = books.now, description = null } = booking
  const detail = {
    amount: fee,
    application: null,
    currency,
    description: 'Processing fees',
    type: 'stripe_fee',
  }
  return insert(
    books,
    'balance_transaction',
    {
      id: await newId(books, 'balance_transaction'),
      object: 'balance_transaction',
      amount,
      available_on: availableOn,
      balance_type: 'payments',
      created: books.now,
      currency,
      description,
      exchange_rate: null,
      fee,
      fee_details: fee === 0 ? [] : [detail],
      net: amount - fee,
      reporting_category: type,
      source,
      status: availableOn <= books.now ? 'available' : 'pending',
      type,
    },
    { hidden: {} },
  )
}

/** A balance in the provider’s units. */
export type Sum = { currency: string; available: number; pending: number }

/** The account's balance by currency. */
export async function balanceOf({ sql, account, now }: Books): Promise<Sum[]> {
  const { rows } = await sql.query(
    `select body->>'currency' as currency,
            coalesce(sum((body->>'net')::bigint) filter (where (body->>'available_on')::bigint <= $2), 0)::text as available,
            coalesce(sum((body->>'net')::bigint) filter (where (body->>'available_on')::bigint > $2), 0)::text as pending
     from sandbox.objects where account = $1 and kind = 'balance_transaction' group by 1 order by 1`,
    [account, now],
  )
  return rows.map(({ currency, available, pending }) => ({
    currency,
    available: Number(available),
    pending: Number(pending),
  }))
}
