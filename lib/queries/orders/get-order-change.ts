import 'server-only'
import type { OrderFormView } from '@/lib/contracts/order-quote'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { can, type Actor } from '@/lib/core/policy/can'
import { getOrder } from '@/lib/queries/orders/get-order'
import { getOrderForm } from '@/lib/queries/orders/get-order-form'
import { OrderLine } from '@/models'

/**
 * What the page that changes an order needs: the offers of its run and the order's own lines as the form's values; `run`
 * null where nothing can be changed. Null for everybody but its buyer. Bounded.
 */
export async function getOrderChange(asked: { actor: Actor; orderId: string; now: Date }): Promise<{
  order: OrderPageView
  run: OrderFormView | null
  values: Record<string, string>
} | null> {
  const { actor, orderId, now } = asked
  const order = await getOrder(asked)
  if (!order || actor.kind !== 'person') return null
  const lines = await OrderLine.findAll({ where: { orderId }, order: [['position', 'ASC']] })
  if (!can(actor, 'order:change', { personId: order.personId })) return null
  const form = order.can.includes('change')
    ? await getOrderForm({ actor, workshop: order.workshop.slug, module: order.module.slug, now })
    : null
  const run = form?.run === order.run ? form : null
  const pairs = (run?.offers ?? []).flatMap(({ offer }, i) => {
    const line = lines.find(({ offerKind }) => offerKind === offer)
    return [
      [`lines.${i}.quantity`, String(line?.quantity ?? 0)],
      ...(line?.choices ?? []).map(({ choiceId, answerId }) => [`lines.${i}.choices.${choiceId}`, answerId]),
    ]
  })
  return { order, run, values: Object.fromEntries(pairs) as Record<string, string> }
}
