import { OrderInput } from '@/lib/contracts/orders'
import { payOrder } from '@/lib/services/payments/pay-order'
import { placeOrder } from '@/lib/services/orders/place-order'
import type { Buyer } from '../crowd'
import type { Stage } from '../stage'
import type { Story } from '../story'
import { done } from './done'

/** Published test cards by what they do: see lib/gateways/payments/fake/cards.ts. */
export const CARD = {
  pays: '4242 4242 4242 4242',
  german: '4000 0027 6000 0016',
  asksAlways: '4000 0027 6000 3184',
  refusedLater: '4000 0000 0000 0341',
  disputedAsMissing: '4000 0000 0000 2685',
} as const

const DAYS_AT_ONCE = 3

export type Wanted = Buyer & {
  lines: readonly { offer: 'boards' | 'kit' | 'built'; quantity: number }[]
  card?: string
}

/**
 * People order over some days from now, one after another, and fill in the card page while the next one orders. Gives
 * back each order's id.
 */
export async function* placeOrders(
  stage: Stage,
  run: string,
  wanted: readonly Wanted[],
  days: number,
): Story<string[]> {
  const began = await stage.now()
  const orders: string[] = []
  for (let day = 0; day < days; day += DAYS_AT_ONCE) {
    const upTo = (passed: number) => Math.round((wanted.length * Math.min(passed, days)) / days)
    const paying: Promise<void>[] = []
    for (const { email, address, lines, card = CARD.pays } of wanted.slice(
      upTo(day),
      upTo(day + DAYS_AT_ONCE),
    )) {
      const [actor, now] = [await stage.person(email), await stage.now()]
      const input = OrderInput.parse({ run, lines, address })
      const placed = done(await placeOrder({ actor, input, now }), `an order of ${email}`)
      orders.push(placed.order)
      if (placed.payUrl !== null) paying.push(pay(stage, placed.payUrl, card))
    }
    await Promise.all(paying)
    await stage.settle()
    yield new Date(began.getTime() + Math.min(day + DAYS_AT_ONCE, days) * 86_400_000)
  }
  return orders
}

/** Somebody pays what is due now from the page of their order. */
export async function payWhatIsDue(
  stage: Stage,
  email: string,
  orderId: string,
  card: string,
): Promise<void> {
  const [actor, now] = [await stage.person(email), await stage.now()]
  const { payUrl } = done(await payOrder({ actor, orderId, otherCard: true, now }), `a payment of ${email}`)
  await pay(stage, payUrl, card)
  await stage.settle()
}

async function pay(stage: Stage, payUrl: string, card: string): Promise<void> {
  const outcome = await stage.pay(payUrl, card)
  if (outcome !== 'captured') throw new Error(`the demo: a payment ${outcome}`)
}
