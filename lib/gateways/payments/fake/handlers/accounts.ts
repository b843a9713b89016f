import 'server-only'
import type Stripe from 'stripe'
import { env } from '@/lib/config/env'
import { balanceOf } from '@/lib/gateways/payments/fake/balance'
import { type Books, hiddenOf, insert, load, newId, save } from '@/lib/gateways/payments/fake/books'
import { invalid } from '@/lib/gateways/payments/fake/errors'
import { emit } from '@/lib/gateways/payments/fake/events'
import { balanceSettings, newAccount } from '@/lib/gateways/payments/fake/objects/account'
import { type Call, route } from '@/lib/gateways/payments/fake/route'

/** Real ones last a few minutes. */
const LINK_SECONDS = 300

/** An account's object is kept in its own books, whoever asks. */
const within = (books: Books, account: string): Books => ({ ...books, account })

async function createAccount({ books, params }: Call): Promise<Stripe.Account> {
  const country = params.text('country')
  if (!/^[A-Z]{2}$/.test(country)) throw invalid(`Country '${country}' is unknown.`, 'country')
  const id = await newId(books, 'account')
  const account = newAccount({
    id,
    now: books.now,
    country,
    currency: params.optional('default_currency') ?? 'eur',
    email: params.text('email'),
    name: params.optional('business_profile.name') ?? '',
    metadata: params.map('metadata'),
  })
  // Published default for accounts that answer to the provider themselves: the bank may be debited.
  const hidden = { interval: 'daily', bankMayBeDebited: true, paidOutOn: '' } as const
  return insert(within(books, id), 'account', account, { hidden })
}

async function createLink({ books, params }: Call): Promise<Stripe.AccountLink> {
  const account = params.text('account')
  await load(within(books, account), 'account', account)
  const id = await newId(books, 'account_link')
  const link = {
    id,
    object: 'account_link' as const,
    created: books.now,
    expires_at: books.now + LINK_SECONDS,
    url: `${env().CARD_PAGE_URL}/onboarding/${id}`,
  }
  const hidden = {
    account,
    returnUrl: params.text('return_url'),
    refreshUrl: params.text('refresh_url'),
    isUsed: false,
  }
  await insert(books, 'account_link', link, { hidden })
  return { object: link.object, created: link.created, expires_at: link.expires_at, url: link.url }
}

async function retrieveSettings({ books }: Call): Promise<Stripe.BalanceSettings> {
  const { interval, bankMayBeDebited } = await hiddenOf(books, 'account', books.account)
  return balanceSettings(interval, bankMayBeDebited)
}

async function updateSettings({ books, params }: Call): Promise<Stripe.BalanceSettings> {
  const wanted = params.text('payments.payouts.schedule.interval')
  if (wanted !== 'manual' && wanted !== 'daily')
    throw invalid(`The sandbox knows no ${wanted} payouts.`, 'interval')
  const hidden = await hiddenOf(books, 'account', books.account)
  const account = await load(books, 'account', books.account)
  await save(books, 'account', account, { hidden: { ...hidden, interval: wanted } })
  const settings = balanceSettings(wanted, hidden.bankMayBeDebited)
  await emit(books, 'balance_settings.updated', settings)
  return settings
}

async function retrieveBalance({ books }: Call): Promise<Stripe.Balance> {
  const sums = await balanceOf(books)
  return {
    object: 'balance',
    available: sums.map(({ currency, available }) => ({ currency, amount: available })),
    pending: sums.map(({ currency, pending }) => ({ currency, amount: pending })),
    livemode: false,
  }
}

/** Accounts, onboarding links, payout schedule and balance. */
export const ACCOUNTS = [
  route<Stripe.Account>(
    'post',
    '/v1/accounts',
    {
      known: ['country', 'email', 'default_currency', 'business_profile.name', 'controller.*', 'metadata.*'],
    },
    createAccount,
  ),
  route<Stripe.Account>('get', '/v1/accounts/:id', { known: [] }, ({ books, id }) =>
    load(within(books, id), 'account', id),
  ),
  route<Stripe.AccountLink>(
    'post',
    '/v1/account_links',
    { known: ['account', 'type', 'return_url', 'refresh_url'] },
    createLink,
  ),
  route<Stripe.BalanceSettings>('get', '/v1/balance_settings', { known: [] }, retrieveSettings),
  route<Stripe.BalanceSettings>(
    'post',
    '/v1/balance_settings',
    { known: ['payments.payouts.schedule.interval'] },
    updateSettings,
  ),
  route<Stripe.Balance>('get', '/v1/balance', { known: [] }, retrieveBalance),
]
