import 'server-only'
import { book } from '@/lib/gateways/payments/fake/balance'
import { accountOf, hiddenOf, load, newId, save, withBooks } from '@/lib/gateways/payments/fake/books'
import { openDispute } from '@/lib/gateways/payments/fake/dispute-money'
import { emit } from '@/lib/gateways/payments/fake/events'
import { sandboxPool } from '@/lib/gateways/payments/fake/pool'
import { EMPTY_BOOKS } from '@/lib/gateways/payments/fake/schema'

/** A buyer's bank disputes this payment now. For tests and the demo. */
export async function disputePayment(payment: string, reason = 'product_not_received'): Promise<string> {
  const account = await accountOf(payment)
  if (account === null) throw new RangeError(`disputePayment: no payment ${payment}`)
  return withBooks(account, async (books) => {
    const intent = await load(books, 'payment_intent', payment)
    const charge = await load(books, 'charge', String(intent.latest_charge))
    return (await openDispute(books, charge, reason)).id
  })
}

/** Whether missing money for a refund may be taken from the owner's bank; without, such refunds wait. */
export async function setBankDebits(account: string, isAllowed: boolean): Promise<void> {
  await withBooks(account, async (books) => {
    const hidden = await hiddenOf(books, 'account', account)
    await save(books, 'account', await load(books, 'account', account), {
      hidden: { ...hidden, bankMayBeDebited: isAllowed },
    })
  })
}

/** Money the owner puts on the account, in the provider's units, available at once. */
export async function addFunds(account: string, amount: number, currency: string): Promise<void> {
  await withBooks(account, async (books) => {
    const source = await newId(books, 'payout')
    await book(books, { type: 'topup', amount, currency: currency.toLowerCase(), source })
  })
}

/** Suspends or restores charging on an account, as the provider may do any day. */
export async function setCharges(account: string, isEnabled: boolean): Promise<void> {
  await withBooks(account, async (books) => {
    const before = await load(books, 'account', account)
    const after = await save(books, 'account', { ...before, charges_enabled: isEnabled })
    await emit(books, 'account.updated', after)
  })
}

/** Forgets everything; for tests. */
export async function emptyBooks(): Promise<void> {
  await (await sandboxPool()).query(EMPTY_BOOKS)
}
