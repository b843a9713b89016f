import 'server-only'
import { accountOf, hiddenOf, load, save, withBooks } from '@/lib/gateways/payments/fake/books'
import { emit } from '@/lib/gateways/payments/fake/events'
import { onboarded } from '@/lib/gateways/payments/fake/objects/account'

/** Switches charges on for an account, as when its owner has filled in the provider's forms. */
export async function finishOnboarding(account: string): Promise<void> {
  await withBooks(account, async (books) => {
    const before = await load(books, 'account', account)
    if (before.charges_enabled) return
    const after = await save(books, 'account', onboarded(before))
    await emit(books, 'account.updated', after)
  })
}

/** Where a link leads and whether it is still good. */
export type OnboardingLink = { account: string; returnUrl: string; refreshUrl: string; isGood: boolean }

/** What a link leads to; null for one that never was. A link is good once and for minutes. */
export async function onboardingLinkOf(linkId: string): Promise<OnboardingLink | null> {
  const owner = await accountOf(linkId)
  if (owner === null) return null
  return withBooks(owner, async (books) => {
    const link = await load(books, 'account_link', linkId)
    const { account, returnUrl, refreshUrl, isUsed } = await hiddenOf(books, 'account_link', linkId)
    return { account, returnUrl, refreshUrl, isGood: !isUsed && link.expires_at > books.now }
  })
}

/** Uses a link up; false when somebody was faster or it is too old. */
export async function useOnboardingLink(linkId: string): Promise<boolean> {
  const owner = await accountOf(linkId)
  if (owner === null) return false
  return withBooks(owner, async (books) => {
    const link = await load(books, 'account_link', linkId)
    const hidden = await hiddenOf(books, 'account_link', linkId)
    if (hidden.isUsed || link.expires_at <= books.now) return false
    await save(books, 'account_link', link, { hidden: { ...hidden, isUsed: true } })
    return true
  })
}
