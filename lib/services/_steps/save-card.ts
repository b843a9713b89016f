import 'server-only'
import type { Transaction } from 'sequelize'
import type { PaymentFacts } from '@/lib/gateways/payments/types'
import { type Order, ProviderCustomer } from '@/models'

/**
 * Remembers the card a deposit was paid with, for the balance the buyer agreed to. An older one gives way.
 * Locks: nothing. Writes: the provider's customer. Repeat: safe.
 */
export async function saveCard(
  tx: Transaction,
  order: Order,
  payment: PaymentFacts,
  now: Date,
): Promise<void> {
  if (payment.method === null) return
  await ProviderCustomer.update(
    {
      methodId: payment.method,
      methodBrand: payment.card?.brand ?? null,
      methodLast4: payment.card?.last4 ?? null,
      methodSavedAt: now,
    },
    { where: { workshopId: order.workshopId, personId: order.personId }, transaction: tx },
  )
}
