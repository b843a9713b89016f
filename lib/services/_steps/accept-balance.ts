import 'server-only'
import type { Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import type { PaymentFacts } from '@/lib/gateways/payments/types'
import { paths } from '@/lib/paths'
import { dropBalanceDues } from '@/lib/services/_steps/balance-dues'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { openParcelForOrder } from '@/lib/services/_steps/open-parcel-for-order'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { promisesOf } from '@/lib/services/_steps/promises-of'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import type { LockedPayment } from '@/lib/services/_steps/locked-payment'
import type { Invoice } from '@/models'

/**
 * A balance counts: the order is paid and its parcel enters the pack queue; nothing reminds the buyer any more.
 * Run and order are locked by the caller. Writes: order, parcel, due rows, mail. Repeat: not safe; called once per
 * capture.
 */
export async function acceptBalance(
  tx: Transaction,
  { order, attempt }: LockedPayment,
  { payment, invoice, now }: { payment: PaymentFacts; invoice: Invoice; now: Date },
): Promise<void> {
  const moved = await moveOrder(tx, order, 'balance_captured', { now })
  if (!moved.ok) throw new Error(`order ${order.id} cannot take a balance from ${order.state}`)
  await dropBalanceDues(tx, order.id)
  await openParcelForOrder(tx, order, now)
  const { ofOrder } = await orderMailFacts(tx, order)
  await queueMail(tx, {
    kind: 'balance_paid',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: attempt.id,
    props: {
      ...ofOrder,
      currency: order.currency,
      amountMinor: attempt.amountMinor,
      paidTotalMinor: order.totalMinor,
      cardEnding: payment.card?.last4 || null,
      invoiceUrl: `${env().BASE_URL}${paths.api.invoice(invoice.id)}`,
      promises: await promisesOf(tx, order),
    },
    now,
  })
}
