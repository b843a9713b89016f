import 'server-only'
import { Op } from 'sequelize'
import type { OrderView } from '@/lib/contracts/orders'
import type { Actor } from '@/lib/core/policy/can'
import { findOrders } from '@/lib/queries/orders/find-orders'
import { toOrderView } from '@/lib/queries/orders/to-order-view'
import { ProviderCustomer } from '@/models'

const PER_PAGE = 50

/**
 * A person's own orders in every workshop, newest first, a page at a time. `next` is the mark to go on from; a mark that
 * cannot be read begins at the newest. Bounded: a statement per table.
 */
export async function listOwnOrders(asked: {
  actor: Actor
  after?: string | undefined
  now: Date
}): Promise<{ items: OrderView[]; next: string | null }> {
  const { actor } = asked
  if (actor.kind !== 'person') return { items: [], next: null }
  const found = await findOrders({ personId: actor.personId, ...olderThan(asked.after) }, PER_PAGE + 1)
  const page = found.slice(0, PER_PAGE)
  const cards = await ProviderCustomer.findAll({ where: { personId: actor.personId } })
  const last = page.at(-1)?.order
  return {
    items: page.map((each) =>
      toOrderView(each, cards.find(({ workshopId }) => workshopId === each.workshop.id) ?? null, asked.now),
    ),
    next: found.length > PER_PAGE && last ? `${last.placedAt.toISOString()}_${last.id}` : null,
  }
}

function olderThan(mark: string | undefined) {
  const [at, id] = mark?.split('_') ?? []
  if (!at || !id || Number.isNaN(Date.parse(at)) || !/^[0-9a-f-]{36}$/.test(id)) return {}
  const placedAt = new Date(at)
  return { [Op.or]: [{ placedAt: { [Op.lt]: placedAt } }, { placedAt, id: { [Op.lt]: id } }] }
}
