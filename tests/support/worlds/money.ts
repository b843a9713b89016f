import { POST as receiveWebhook } from '@/app/api/webhooks/stripe/route'
import type { OrderInput } from '@/lib/contracts/orders'
import { payments } from '@/lib/gateways/payments'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { finishOnboarding } from '@/lib/gateways/payments/fake/onboarding'
import { payAsCustomer } from '@/lib/gateways/payments/fake/pay-as-customer'
import { placeOrder } from '@/lib/services/orders/place-order'
import { LedgerEntry, Order, PaymentAttempt, type Run, TaxRate } from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { runJobs } from '@/tests/support/run-jobs'
import { NOW, serial } from './base'
import { makeModule } from './module'
import { actorOf, makeUser } from './person'
import { makeRun } from './run'
import { makeWorkshop } from './workshop'

/** A workshop whose account is in the provider's books, with a run of 3 to 5 that takes deposits; it is NOW. */
export async function moneyWorld(
  over: Parameters<typeof makeRun>[1] = {},
  { currency = 'EUR', country = 'DE' }: { currency?: string; country?: string } = {},
) {
  await setBusinessTime(NOW)
  const made = await payments().createAccount({
    key: `account-${serial()}-${Math.random()}`,
    workshopId: `workshop-${serial()}`,
    country,
    currency,
    email: 'owner@workshop.example',
    name: 'Workshop',
  })
  if (!made.ok) throw new Error(made.reason)
  await finishOnboarding(made.value.account)
  const house = await makeWorkshop({ providerAccountId: made.value.account, currency, country })
  const rate = { workshopId: null, country: 'DE', validFrom: '2021-01-01' }
  await TaxRate.findOrCreate({ where: { ...rate, basisPoints: 1900 } })
  const design = await makeModule(house.workshop)
  const parts = await makeRun({ ...house, ...design }, over)
  return { ...house, ...parts, account: made.value.account }
}

/** Somebody signed in who has ordered nothing. */
export async function makeBuyer() {
  const { person } = await makeUser()
  return { person, actor: await actorOf(person) }
}

/** An order as the form sends it: one kit to a house of its own in Ulm. */
export function orderInput(run: Run, over: Partial<OrderInput> = {}): OrderInput {
  return {
    run: run.id,
    lines: [{ offer: 'kit', quantity: 1 }],
    address: { country: 'DE', name: 'A. Berg', lines: [`Hof ${serial()}`], postcode: '89073', city: 'Ulm' },
    ...over,
  }
}

/** Places an order and answers it with its open card page. */
export async function placed(run: Run, over: Partial<OrderInput> = {}, now = NOW) {
  const buyer = await makeBuyer()
  const answer = await placeOrder({ actor: buyer.actor, input: orderInput(run, over), now })
  if (!answer.ok) throw new Error(`refused: ${answer.reason}`)
  const order = await Order.findByPk(answer.value.order, { rejectOnEmpty: true })
  return { ...buyer, ...answer.value, order }
}

export const CARD = {
  pays: '4242 4242 4242 4242',
  asksAlways: '4000 0027 6000 3184',
  refused: '4000 0000 0000 0002',
  refusedLater: '4000 0000 0000 0341',
  refundLater: '4000 0000 0000 7726',
  refundFails: '4000 0000 0000 5126',
} as const

/** Hands a card in on the page of an order. */
export const pay = (payUrl: string | null, card: string = CARD.pays) =>
  payAsCustomer({ payUrl: payUrl ?? '', card })

/** The events the provider has sent are received, stored and applied, and what follows is done. */
export async function settleAll(): Promise<void> {
  for (let round = 0; round < 10; round += 1) {
    const { delivered, refused } = await deliverDueEvents({ deliver: toOurDoor, isHurried: true })
    if (refused > 0) throw new Error(`${refused} events were refused`)
    await runJobs()
    if (delivered === 0) return
  }
  throw new Error('the provider keeps sending')
}

/** The door events come through, without the network. */
export const toOurDoor = async (body: string, signature: string) =>
  (await receiveWebhook(webhookRequest(body, signature))).status

export const webhookRequest = (body: string, signature: string) =>
  new Request('http://localhost:3000/api/webhooks/stripe', {
    method: 'POST',
    headers: { 'content-type': 'application/json', 'stripe-signature': signature },
    body,
  })

/** Places, pays and lets it arrive: an order under deposit. */
export async function reserved(run: Run, over: Partial<OrderInput> = {}, card: string = CARD.pays) {
  const made = await placed(run, over)
  await pay(made.payUrl, card)
  await settleAll()
  await made.order.reload()
  return made
}

export const attemptsOf = (order: Order) =>
  PaymentAttempt.findAll({
    where: { orderId: order.id },
    order: [
      ['purpose', 'DESC'],
      ['sequence', 'ASC'],
    ],
  })

/** What stands on each account of a workshop's books, without those at zero. */
export async function booksOf(workshopId: string): Promise<Record<string, number>> {
  const entries = await LedgerEntry.findAll({ where: { workshopId } })
  const sums: Record<string, number> = {}
  for (const { account, amountMinor } of entries) sums[account] = (sums[account] ?? 0) + amountMinor
  return Object.fromEntries(Object.entries(sums).filter(([, sum]) => sum !== 0))
}
