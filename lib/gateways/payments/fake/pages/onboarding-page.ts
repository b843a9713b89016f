import 'server-only'
import { addFunds } from '@/lib/gateways/payments/fake/controls'
import { accountOf, load, withBooks } from '@/lib/gateways/payments/fake/books'
import {
  finishOnboarding,
  onboardingLinkOf,
  useOnboardingLink,
} from '@/lib/gateways/payments/fake/onboarding'
import { escape, type Page, page, seeOther } from '@/lib/gateways/payments/fake/pages/layout'

const NO_LINK = () => page({ status: 404, title: 'No such link', body: '<p>The link is not complete.</p>' })
/** In the provider's units; enough to carry the fees of a small run. */
const FLOAT = 20_000

/** The provider’s forms in three buttons; a used link leads to the refresh address. */
export async function showOnboarding(linkId: string): Promise<Page> {
  const link = await onboardingLinkOf(linkId)
  if (link === null) return NO_LINK()
  if (!link.isGood) return seeOther(link.refreshUrl)
  return page({
    title: 'Payment account',
    leadsTo: [link.returnUrl, link.refreshUrl],
    body: `<p>A real provider would ask here who you are and where your bank account is.</p>
<form class="sheet" method="post" action="/onboarding/${escape(linkId)}"><p>Account ${escape(link.account)}</p>
<button type="submit" name="then" value="enable">Enable charges</button>
<button type="submit" name="then" value="float" class="other">Enable charges and put a float on the account</button>
<button type="submit" name="then" value="leave" class="other">Leave without finishing</button></form>`,
  })
}

/** Takes the owner’s choice and leads back. */
export async function postOnboarding(linkId: string, then: string): Promise<Page> {
  const link = await onboardingLinkOf(linkId)
  if (link === null) return NO_LINK()
  if (!(await useOnboardingLink(linkId))) return seeOther(link.refreshUrl)
  if (then === 'leave') return seeOther(link.returnUrl)
  await finishOnboarding(link.account)
  if (then === 'float') await addFunds(link.account, FLOAT, await currencyOf(link.account))
  return seeOther(link.returnUrl)
}

async function currencyOf(account: string): Promise<string> {
  const owner = (await accountOf(account)) ?? account
  return withBooks(owner, async (books) => (await load(books, 'account', account)).default_currency ?? 'eur')
}
