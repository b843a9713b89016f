import type { OrderState } from '@/lib/core/states/order'

/** Where an order may stand once everything under way has arrived: as few states as what was answered allows. */
export type ModelOrder = {
  readonly index: number
  readonly units: number
  after: ReadonlySet<OrderState>
  card: string | null
}

/** What the people of a run were told, and nothing else: the simple model the application is compared with. */
export type Model = {
  run: 'taking_deposits' | 'locked' | 'called_off'
  /** When each was answered. */
  signUps: Date[]
  orders: ModelOrder[]
}

export const newModel = (): Model => ({ run: 'taking_deposits', signUps: [], orders: [] })

export type Step = (state: OrderState) => readonly OrderState[]

/** One order, or all, moved on; `isSure` false when nobody was told whether it happened. */
export function move(orders: readonly ModelOrder[], step: Step, isSure: boolean): void {
  for (const order of orders) {
    const moved = [...order.after].flatMap((state) => [...step(state)])
    order.after = new Set(isSure ? moved : [...order.after, ...moved])
  }
}

export const PAID: Step = (state) => {
  if (state === 'awaiting_deposit') return ['reserved']
  if (state === 'balance_due') return ['paid']
  return state === 'expired' ? ['expired', 'reserved'] : [state]
}

export const CANCELLED: Step = () => ['cancelled']

/** Whoever waited and was offered a place keeps it; those who had not paid by then lose it. */
export const LOCKED: Step = (state) =>
  state === 'awaiting_deposit' ? ['expired', 'awaiting_deposit'] : [state]

export const ASKED: Step = (state) => (state === 'reserved' ? ['reserved', 'balance_due'] : [state])

/** A hold or a balance whose time is over may have ended before its turn came. */
export const CALLED_OFF: Step = (state) => {
  if (state === 'expired' || state === 'lapsed') return [state]
  if (state === 'awaiting_deposit') return ['cancelled', 'expired']
  return state === 'balance_due' ? ['cancelled', 'lapsed'] : ['cancelled']
}

/** Time brings the ends of holds, offers to those who wait, charges and lapses. */
export const TIME_PASSED: Step = (state) => {
  if (state === 'waiting') return ['waiting', 'awaiting_deposit', 'expired']
  if (state === 'awaiting_deposit') return ['awaiting_deposit', 'expired']
  return state === 'balance_due' ? ['balance_due', 'paid', 'lapsed'] : [state]
}

/** A place that came free is offered to whoever waits. */
export const PLACE_FREED: Step = (state) => (state === 'waiting' ? ['waiting', 'awaiting_deposit'] : [state])
