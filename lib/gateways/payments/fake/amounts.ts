import 'server-only'
import { PROVIDER_MAXIMUM, PROVIDER_MINIMUM } from '@/lib/core/money/provider-rules'
import { type Books, load } from '@/lib/gateways/payments/fake/books'
import { invalid, ProviderRefusal } from '@/lib/gateways/payments/fake/errors'

const THREE_DECIMALS = ['bhd', 'jod', 'kwd', 'omr', 'tnd']
const HUNDREDS = ['isk', 'ugx']

/** Refuses an amount the provider would not charge; both are in the provider's units. */
export function requireAmount(amount: number, currency: string): void {
  const code = currency.toUpperCase()
  if (!/^[a-z]{3}$/.test(currency)) throw invalid(`Invalid currency: ${currency}.`, 'currency')
  if (amount < Math.max(1, PROVIDER_MINIMUM[code] ?? 1)) {
    throw invalid('Amount must be at least the minimum of this currency.', 'amount', 'amount_too_small')
  }
  if (amount > (PROVIDER_MAXIMUM[code] ?? PROVIDER_MAXIMUM.others)) {
    throw invalid('Amount must be no more than the maximum of this currency.', 'amount', 'amount_too_large')
  }
  const step = THREE_DECIMALS.includes(currency) ? 10 : HUNDREDS.includes(currency) ? 100 : 1
  if (amount % step !== 0) throw invalid(`Invalid amount for ${code}: not a multiple of ${step}.`, 'amount')
}

/** Only an account that went through onboarding can be charged on. */
export async function requireCharges(books: Books): Promise<void> {
  const account = await load(books, 'account', books.account)
  if (account.charges_enabled) return
  const message = 'Your account cannot currently make live charges.'
  throw new ProviderRefusal(
    403,
    { type: 'invalid_request_error', code: 'account_invalid', message },
    'nothing',
  )
}
