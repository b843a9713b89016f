import 'server-only'
import type { Transaction } from 'sequelize'
import { hasWithdrawalRight } from '@/lib/core/promises/withdrawal'
import { type Order, TermsVersion } from '@/models'

/**
 * What happens to the deposit should an order lapse: returned, or kept where the terms it was placed under said so and the
 * buyer's law allows it (nowhere with a right to withdraw, which gives the deposit back).
 * Locks, writes: nothing.
 */
export async function depositThen(tx: Transaction, order: Order): Promise<'returned' | 'kept'> {
  const terms = order.termsVersionId
    ? await TermsVersion.findByPk(order.termsVersionId, { transaction: tx })
    : null
  return terms?.lapseKeepsDeposit && !hasWithdrawalRight(order.country) ? 'kept' : 'returned'
}
