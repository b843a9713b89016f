import type { FulfilmentOrder, PaperLine } from '@/lib/contracts/papers'

export type SameContents = { lines: readonly PaperLine[]; orders: FulfilmentOrder[] }
export type ToPick = Omit<PaperLine, 'serials'>

const thing = ({ module, offer, choices }: ToPick) => JSON.stringify([module, offer, [...choices].sort()])
const contents = (lines: readonly PaperLine[]) =>
  JSON.stringify(lines.map((line) => [thing(line), line.quantity]).sort())

/** Orders of the same contents together, groups in the order in which their first order comes. */
export function groupByContents(orders: readonly FulfilmentOrder[]): SameContents[] {
  const groups = new Map<string, SameContents>()
  for (const order of orders) {
    const key = contents(order.lines)
    const group = groups.get(key) ?? { lines: order.lines, orders: [] }
    group.orders.push(order)
    groups.set(key, group)
  }
  return [...groups.values()]
}

/** How many of each thing the orders need together, in the order in which the things first come. */
export function toPick(orders: readonly FulfilmentOrder[]): ToPick[] {
  const picks = new Map<string, ToPick>()
  for (const line of orders.flatMap((order) => order.lines)) {
    const { module, offer, choices } = line
    const before = picks.get(thing(line))?.quantity ?? 0
    picks.set(thing(line), { module, offer, choices, quantity: before + line.quantity })
  }
  return [...picks.values()]
}
