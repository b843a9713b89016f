import type { Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { payments } from '@/lib/gateways/payments'
import { startCardPage } from '@/lib/gateways/payments/fake/card-page-server'
import {
  CARD,
  chargeArgs,
  checkoutArgs,
  newBuyer,
  newKey,
  openAccount,
  paidDeposit,
  valueOf,
} from './support'

let server: Server
let origin: string
let account: string
let customer: string
beforeAll(async () => {
  server = await startCardPage(0)
  origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
  account = await openAccount()
  customer = await newBuyer(account)
})
afterAll(() => new Promise((resolve) => server.close(resolve)))

const here = (url: string) => origin + new URL(url).pathname
const get = (url: string) => fetch(here(url), { redirect: 'manual' })
const post = (url: string, form: Record<string, string>) =>
  fetch(here(url), { method: 'POST', body: new URLSearchParams(form), redirect: 'manual' })
const open = async () => {
  const args = await checkoutArgs({ account, customer })
  return { ...valueOf(await payments().createCheckout(args)), ...args }
}

describe('the card page', () => {
  test('is plainly marked, shows what is paid, has no script and names where it leads', async () => {
    const { url } = await open()
    const page = await get(url)
    const html = await page.text()
    expect(page.status).toBe(200)
    expect(html).toContain('Sandbox card page, no real money')
    expect(html).toContain('Deposit for order 1')
    expect(html).toMatch(/€\s?25\.00/)
    expect(html).not.toContain('<script')
    expect(page.headers.get('content-security-policy')).toContain("form-action 'self' http://localhost:3000;")
  })

  test('takes a card and leads back with the session’s id', async () => {
    const { url, sessionId } = await open()
    const paid = await post(url, { number: CARD.pays })
    expect(paid.status).toBe(303)
    expect(paid.headers.get('location')).toBe(`http://localhost:3000/account/orders/1?session=${sessionId}`)
    expect((await get(url)).headers.get('location')).toContain(sessionId)
  })

  test('says why a card was refused, keeps what was typed, and stays open', async () => {
    const { url } = await open()
    for (const [number, words] of [
      [CARD.tooLittle, 'Your card has insufficient funds.'],
      ['1234 <b>', 'This is not one of the test numbers below.'],
    ] as const) {
      const refused = await post(url, { number })
      const html = await refused.text()
      expect(refused.status).toBe(422)
      expect(html).toContain(words)
      expect(html).not.toContain('<b>')
      expect(html).toContain(number.slice(0, 4))
    }
    expect((await post(url, { number: CARD.pays })).status).toBe(303)
  })

  test('asks for the bank’s yes where the card wants it', async () => {
    const { url, sessionId } = await open()
    const asked = await post(url, { number: CARD.asksOnce })
    const bank = String(asked.headers.get('location'))
    expect(new URL(bank).pathname).toMatch(/^\/authenticate\/pi_/)
    expect(await (await get(bank)).text()).toContain('Is this payment yours?')
    const refused = await post(bank, { answer: 'no' })
    expect(await refused.text()).toContain('The payment was not confirmed with the bank.')
    const again = await post(url, { number: CARD.asksOnce })
    const done = await post(String(again.headers.get('location')), { answer: 'yes' })
    expect(done.headers.get('location')).toContain(sessionId)
  })

  test('finishes a balance and leads back to the order', async () => {
    const { method } = await paidDeposit({ account, customer }, CARD.asksAlways)
    const asked = valueOf(await payments().chargeSavedCard(chargeArgs({ account, customer, method })))
    const { payment } = asked.payment
    const returnUrl = 'http://localhost:3000/account/orders/1?tab=pay'
    const go = valueOf(await payments().finishPayment({ account, key: newKey(), payment, returnUrl }))
    const done = await post(go.state === 'go' ? go.url : '', { answer: 'yes' })
    expect(done.headers.get('location')).toBe(
      `${returnUrl}&payment_intent=${payment}&redirect_status=succeeded`,
    )
  })

  test('once it has ended it charges nobody', async () => {
    const { url, sessionId } = await open()
    valueOf(await payments().expireCheckout({ account, key: newKey(), sessionId }))
    const html = await (await post(url, { number: CARD.pays })).text()
    expect(html).toContain('This card page has ended')
    expect(html).toContain('href="http://localhost:3000/account/orders/1"')
  })

  test('answers what it should not be asked with 4xx', async () => {
    const { url } = await open()
    const asked = await Promise.all([
      fetch(`${origin}/`),
      fetch(`${origin}/pay/cs_test_nobody`),
      fetch(`${origin}/authenticate/pi_nobody`),
      fetch(`${origin}/onboarding/al_nobody`),
      fetch(here(url), { method: 'DELETE' }),
      post(url, { number: '4'.repeat(20_000) }),
    ])
    expect(asked.map(({ status }) => status)).toEqual([404, 404, 404, 404, 405, 413])
  })
})

describe('the onboarding page', () => {
  const link = async () => {
    const made = await payments().createAccount({
      key: newKey(),
      workshopId: 'w',
      country: 'DE',
      currency: 'EUR',
      email: 'owner@workshop.example',
      name: 'Test',
    })
    const { account: fresh } = valueOf(made)
    const given = {
      account: fresh,
      returnUrl: 'http://localhost:3000/back',
      refreshUrl: 'http://localhost:3000/again',
    }
    return { fresh, ...valueOf(await payments().onboardingLink(given)) }
  }
  const isReady = async (id: string) => valueOf(await payments().getAccount({ account: id })).chargesEnabled

  test('switches charges on and leads back; the link is good once', async () => {
    const { fresh, url } = await link()
    expect(await (await get(url)).text()).toContain('Enable charges')
    const done = await post(url, { then: 'enable' })
    expect(done.headers.get('location')).toBe('http://localhost:3000/back')
    expect(await isReady(fresh)).toBe(true)
    expect((await get(url)).headers.get('location')).toBe('http://localhost:3000/again')
  })

  test('may be left unfinished, or leave a float on the account', async () => {
    const left = await link()
    expect((await post(left.url, { then: 'leave' })).status).toBe(303)
    expect(await isReady(left.fresh)).toBe(false)
    const rich = await link()
    await post(rich.url, { then: 'float' })
    expect(valueOf(await payments().balance({ account: rich.fresh })).available).toEqual([
      { currency: 'EUR', amount: 20_000 },
    ])
  })
})
