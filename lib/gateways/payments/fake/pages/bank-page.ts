import 'server-only'
import { accountOf, hiddenOf, load, withBooks } from '@/lib/gateways/payments/fake/books'
import { answerBank, type BankAnswer } from '@/lib/gateways/payments/fake/bank-answer'
import { showCardPage, successUrlOf, sumOf } from '@/lib/gateways/payments/fake/pages/card-page'
import { escape, type Page, page, seeOther } from '@/lib/gateways/payments/fake/pages/layout'

const NO_PAYMENT = () =>
  page({ status: 404, title: 'No such payment', body: '<p>The link is not complete.</p>' })

/** The published way back: the payment's id and how it went are added to the return address. */
function backTo(returnUrl: string, payment: string, isPaid: boolean): string {
  const url = new URL(returnUrl)
  url.searchParams.set('payment_intent', payment)
  url.searchParams.set('redirect_status', isPaid ? 'succeeded' : 'failed')
  return url.toString()
}

/** The bank’s question; a payment nobody asks about any more leads back. */
export async function showBankPage(intentId: string): Promise<Page> {
  const account = await accountOf(intentId)
  if (account === null) return NO_PAYMENT()
  const { intent, returnUrl, session } = await withBooks(account, async (books) => {
    const hidden = await hiddenOf(books, 'payment_intent', intentId)
    return { intent: await load(books, 'payment_intent', intentId), ...hidden }
  })
  if (intent.status !== 'requires_action') {
    if (session !== null) return showCardPage(session)
    if (returnUrl !== null) return seeOther(backTo(returnUrl, intentId, intent.status === 'succeeded'))
  }
  return page({
    title: 'Your bank asks you',
    leadsTo: [returnUrl],
    body: `<p class="sum">${escape(sumOf(intent.amount, intent.currency))}</p>
<form class="sheet" method="post" action="/authenticate/${escape(intentId)}"><p>Is this payment yours?</p>
<button type="submit" name="answer" value="yes">Yes, pay</button>
<button type="submit" name="answer" value="no" class="other">No, refuse</button></form>`,
  })
}

function after(answer: BankAnswer): Promise<Page> | Page {
  const { intent, session, returnUrl } = answer
  const isPaid = intent.status === 'succeeded'
  if (session !== null) {
    if (isPaid) return seeOther(successUrlOf(session))
    return showCardPage(session.id, intent.last_payment_error?.message ?? 'The payment was not made.')
  }
  if (returnUrl !== null) return seeOther(backTo(returnUrl, intent.id, isPaid))
  return page({ title: isPaid ? 'Paid' : 'Not paid', body: '<p>You can close this page.</p>' })
}

/** Takes the buyer’s answer. */
export async function postBankAnswer(intentId: string, isConfirmed: boolean): Promise<Page> {
  const answer = await answerBank(intentId, isConfirmed)
  return answer === null ? NO_PAYMENT() : after(answer)
}
