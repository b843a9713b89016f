import { z } from 'zod'
import { amountMinor, cardEnding, day, link, money, ofOrder, offerPromise } from '@/lib/contracts/mail-facts'

const balance = { ...ofOrder, ...money, amountMinor, payUrl: link }

/** The second payment of an order. */
export const balanceMails = {
  /** Subject: the order. Sent at least 7 days before `chargeOn`. */
  balance_coming: z.strictObject({
    ...balance,
    chargeOn: day,
    cardEnding,
    promises: z.array(offerPromise).min(1),
  }),
  /** Subject: the payment attempt. */
  balance_paid: z.strictObject({
    ...ofOrder,
    ...money,
    amountMinor,
    paidTotalMinor: amountMinor,
    cardEnding,
    invoiceUrl: link.nullable(),
    promises: z.array(offerPromise).min(1),
  }),
  /** Subject: the payment attempt, or the order where no card was saved to be tried. */
  card_needs_you: z.strictObject({
    ...balance,
    cardEnding,
    why: z.enum(['bank_asks', 'declined', 'expired', 'no_card']),
    lapseOn: day,
  }),
  /** Subject: the order; version: which reminder. */
  balance_reminder: z.strictObject({
    ...balance,
    nth: z.union([z.literal(1), z.literal(2), z.literal(3)]),
    lapseOn: day,
    depositMinor: amountMinor,
    depositThen: z.enum(['returned', 'kept']),
  }),
  /** Subject: the order. */
  order_lapsed: z.strictObject({
    ...ofOrder,
    ...money,
    depositMinor: amountMinor,
    depositThen: z.enum(['returned', 'kept']),
  }),
} as const
