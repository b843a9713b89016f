import 'server-only'
import type Stripe from 'stripe'
import { formatMoney } from '@/lib/core/money/format'
import { fromProvider } from '@/lib/core/money/provider'
import { CARDS } from '@/lib/gateways/payments/fake/cards'
import { accountOf, hiddenOf, withBooks } from '@/lib/gateways/payments/fake/books'
import { handInCard, sessionNow } from '@/lib/gateways/payments/fake/card-session'
import { escape, type Page, page, seeOther } from '@/lib/gateways/payments/fake/pages/layout'

const grouped = (number: string): string => number.replace(/(.{4})(?=.)/g, '$1 ')

function cardTable(): string {
  const rows = Object.entries(CARDS).map(
    ([number, card]) => `<tr><td>${grouped(number)}</td><td>${escape(card.words)}</td></tr>`,
  )
  return `<div class="table" tabindex="0" role="region" aria-label="Test card numbers"><table><caption>Test card numbers</caption>
<thead><tr><th scope="col">Number</th><th scope="col">What it does</th></tr></thead><tbody>${rows.join('')}</tbody></table></div>`
}

/** The amount of a session or payment as people write it. */
export function sumOf(amount: number, currency: string): string {
  const code = currency.toUpperCase()
  return formatMoney(fromProvider(amount, code), code, 'en')
}

/** Where the buyer goes after paying. */
export function successUrlOf(session: Stripe.Checkout.Session): string {
  return (session.success_url ?? '/').replaceAll('{CHECKOUT_SESSION_ID}', session.id)
}

function ended(session: Stripe.Checkout.Session): Page {
  if (session.status === 'complete') return seeOther(successUrlOf(session))
  const back =
    session.cancel_url === null
      ? ''
      : `<p><a class="button" href="${escape(session.cancel_url)}">Back to the shop</a></p>`
  return page({
    title: 'This card page has ended',
    body: `<p>Its time has passed or it was closed. Nothing was charged.</p>${back}`,
  })
}

type Shown = { session: Stripe.Checkout.Session; description: string | null; savesCard: boolean }

function form({ session, description, savesCard }: Shown, trouble: string | null, typed: string): Page {
  const problem =
    trouble === null ? '' : `<p class="trouble" id="trouble" role="alert">${escape(trouble)}</p>`
  const described = trouble === null ? '' : ' aria-describedby="trouble" aria-invalid="true"'
  const saves = savesCard ? '<p>The card is kept, so that the rest can be charged later as agreed.</p>' : ''
  const back =
    session.cancel_url === null
      ? ''
      : `<p><a href="${escape(session.cancel_url)}">Back without paying</a></p>`
  return page({
    status: trouble === null ? 200 : 422,
    title: description ?? 'Payment',
    leadsTo: [session.success_url],
    body: `<p class="sum">${escape(sumOf(session.amount_total ?? 0, session.currency ?? ''))}</p>${problem}
<form class="sheet" method="post" action="/pay/${escape(session.id)}"><label for="number">Card number (a test number)</label>
<input id="number" name="number" inputmode="numeric" autocomplete="off" required value="${escape(typed)}"${described}>${saves}
<button type="submit">Pay ${escape(sumOf(session.amount_total ?? 0, session.currency ?? ''))}</button></form>${back}${cardTable()}`,
  })
}

const NO_SESSION = () =>
  page({ status: 404, title: 'No such card page', body: '<p>The link is not complete.</p>' })

async function shownSession(sessionId: string): Promise<Shown | null> {
  const account = await accountOf(sessionId)
  if (account === null) return null
  return withBooks(account, async (books) => {
    const { description, savesCard } = await hiddenOf(books, 'checkout_session', sessionId)
    return { session: await sessionNow(books, sessionId), description, savesCard }
  })
}

/** The form of an open session; an ended one leads on or says so. */
export async function showCardPage(
  sessionId: string,
  trouble: string | null = null,
  typed = '',
): Promise<Page> {
  const shown = await shownSession(sessionId)
  if (shown === null) return NO_SESSION()
  return shown.session.status === 'open' ? form(shown, trouble, typed) : ended(shown.session)
}

/** Takes a card number. */
export async function postCard(sessionId: string, number: string): Promise<Page> {
  const done = await handInCard(sessionId, number)
  switch (done.state) {
    case 'no_session':
      return NO_SESSION()
    case 'unknown_card':
      return showCardPage(sessionId, 'This is not one of the test numbers below.', number)
    case 'not_open':
      return ended(done.session)
    case 'asks':
      return seeOther(done.url)
    case 'captured':
      return seeOther(done.session === undefined ? '/' : successUrlOf(done.session))
    case 'refused':
      return showCardPage(sessionId, done.error.message, number)
  }
}
