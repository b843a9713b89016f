import { OrderInput } from '@/lib/contracts/orders'
import { placeOrder } from '@/lib/services/orders/place-order'
import type { Buyer } from '../crowd'
import type { Stage } from '../stage'
import { done } from './done'

/** Published test cards by what they do: see lib/gateways/payments/fake/cards.ts. */
export const CARD = {
  pays: '4242 4242 4242 4242',
  german: '4000 0027 6000 0016',
  asksAlways: '4000 0027 6000 3184',
  refusedLater: '4000 0000 0000 0341',
  disputedAsMissing: '4000 0000 0000 2685',
} as const

export type Wanted = Buyer & {
  lines: readonly { offer: 'boards' | 'kit' | 'built'; quantity: number }[]
  card?: string
}

/** People order and pay the deposit, one after another over some days from now. Gives back each order's id. */
export async function placeOrders(
  stage: Stage,
  run: string,
  wanted: readonly Wanted[],
  days: number,
): Promise<string[]> {
  const began = await stage.now()
  const orders: string[] = []
  const perDay = Math.ceil(wanted.length / days)
  for (let day = 0; day * perDay < wanted.length; day += 1) {
    for (const { email, address, lines, card } of wanted.slice(day * perDay, (day + 1) * perDay)) {
      const [actor, now] = [await stage.person(email), await stage.now()]
      const input = OrderInput.parse({ run, lines, address })
      const placed = done(await placeOrder({ actor, input, now }), `an order of ${email}`)
      orders.push(placed.order)
      if (placed.payUrl === null) continue
      const outcome = await stage.pay(placed.payUrl, card ?? CARD.pays)
      if (outcome !== 'captured') throw new Error(`the demo: the deposit of ${email} ${outcome}`)
    }
    await stage.settle()
    await stage.goTo(new Date(began.getTime() + (day + 1) * 86_400_000))
  }
  return orders
}
