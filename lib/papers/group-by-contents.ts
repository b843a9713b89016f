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

/**
 * How many of each thing the orders need together, by the place where it stands; things without a place come last, in the
 * order in which they first come.
 */
export function toPick(orders: readonly FulfilmentOrder[]): ToPick[] {
  const picks = new Map<string, ToPick>()
  for (const line of orders.flatMap((order) => order.lines)) {
    const { module, offer, choices, place } = line
    const before = picks.get(thing(line))?.quantity ?? 0
    picks.set(thing(line), { module, offer, choices, place, quantity: before + line.quantity })
  }
  return [...picks.values()].sort((a, b) => byPlace(a.place ?? '', b.place ?? ''))
}

/** As a shelf is numbered: place 2 before place 10. */
const byPlace = (a: string, b: string) =>
  Number(a === '') - Number(b === '') || a.localeCompare(b, 'en', { numeric: true })
