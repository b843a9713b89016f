import 'server-only'
import type Stripe from 'stripe'
import { fromProvider } from '@/lib/core/money/provider'
import { expanded, fromSeconds, idOf, seconds } from '@/lib/gateways/payments/facts'
import { found } from '@/lib/gateways/payments/outcome'
import type { BookLine, Payments, Window } from '@/lib/gateways/payments/types'

type Part = Pick<Payments, 'listCharges' | 'listRefunds' | 'listDisputes' | 'listFees' | 'listPayouts'>
type Row = { id: string; amount: number; currency: string; created: number }

function line(kind: BookLine['kind'], row: Row, payment: string | null): BookLine {
  const currency = row.currency.toUpperCase()
  return {
    id: row.id,
    kind,
    amount: fromProvider(row.amount, currency),
    currency,
    at: fromSeconds(row.created),
    payment,
  }
}

/** Half open: from ≤ created < to, whole seconds. */
const created = ({ from, to }: Window): Stripe.RangeQueryParam => ({ gte: seconds(from), lt: seconds(to) })

/** Every page of a list; the provider answers newest first. */
async function collect<T>(
  list: AsyncIterable<T>,
  read: (item: T) => BookLine | null,
): Promise<readonly BookLine[]> {
  const lines: BookLine[] = []
  for await (const item of list) {
    const one = read(item)
    if (one !== null) lines.push(one)
  }
  return lines.reverse()
}

/** The payment a balance transaction's source belongs to. */
function paymentOfSource(booked: Stripe.BalanceTransaction): string | null {
  const source = expanded(booked.source as string | Stripe.Charge | null)
  return source !== null && 'payment_intent' in source ? idOf(source.payment_intent) : null
}

/** A fee is a charge's or dispute's share kept by the provider, or a transaction that is nothing but a fee. */
function feeLine(booked: Stripe.BalanceTransaction): BookLine | null {
  const amount = booked.type === 'stripe_fee' ? -booked.net : booked.fee
  if (amount === 0) return null
  return line('fee', { ...booked, amount }, paymentOfSource(booked))
}

/** The lists behind the daily comparison; every page is read through the SDK. */
export function bookCalls(stripe: Stripe): Part {
  const on = (window: Window) => ({ stripeAccount: window.account })
  return {
    listCharges: (window) =>
      found(() =>
        collect(stripe.charges.list({ created: created(window), limit: 100 }, on(window)), (charge) =>
          charge.captured && charge.status === 'succeeded'
            ? line('charge', { ...charge, amount: charge.amount_captured }, idOf(charge.payment_intent))
            : null,
        ),
      ),
    listRefunds: (window) =>
      found(() =>
        collect(stripe.refunds.list({ created: created(window), limit: 100 }, on(window)), (refund) =>
          refund.status === 'failed' || refund.status === 'canceled'
            ? null
            : line('refund', refund, idOf(refund.payment_intent)),
        ),
      ),
    listDisputes: (window) =>
      found(() =>
        collect(stripe.disputes.list({ created: created(window), limit: 100 }, on(window)), (dispute) =>
          // An inquiry (warning_…) withholds nothing; a won one was paid back.
          dispute.status === 'won' || dispute.status.startsWith('warning') || dispute.status === 'prevented'
            ? null
            : line('dispute', dispute, idOf(dispute.payment_intent)),
        ),
      ),
    listFees: (window) =>
      found(() =>
        collect(
          stripe.balanceTransactions.list(
            { created: created(window), limit: 100, expand: ['data.source'] },
            on(window),
          ),
          feeLine,
        ),
      ),
    listPayouts: (window) =>
      found(() =>
        collect(stripe.payouts.list({ created: created(window), limit: 100 }, on(window)), (payout) =>
          payout.status === 'failed' || payout.status === 'canceled' ? null : line('payout', payout, null),
        ),
      ),
  }
}
