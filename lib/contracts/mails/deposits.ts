import { z } from 'zod'
import {
  amountMinor,
  balanceWhen,
  count,
  day,
  instant,
  link,
  mailLine,
  money,
  ofOrder,
  oneLine,
  prose,
} from '@/lib/contracts/mail-facts'

/** From the deposit to the place in the run. */
export const depositsMails = {
  /** Subject: the order. Also the confirmation of the contract on a durable medium, hence the whole terms. */
  deposit_received: z.strictObject({
    ...ofOrder,
    ...money,
    lines: z.array(mailLine.extend({ totalMinor: amountMinor, postedBy: day })).min(1),
    postageMinor: amountMinor,
    taxMinor: amountMinor,
    taxIncluded: z.boolean(),
    totalMinor: amountMinor,
    depositMinor: amountMinor,
    balanceMinor: amountMinor,
    balanceWhen,
    minimum: count,
    decideBy: day,
    /** `by_law`: EU and UK consumers; `by_terms`: everybody else. */
    withdrawal: z.enum(['by_law', 'by_terms']),
    terms: z.strictObject({ version: oneLine(60), text: prose(60_000) }),
  }),
  /** Subject: the order whose held place was let go unpaid. */
  place_released: z.strictObject({
    orderNumber: oneLine(40),
    module: oneLine(),
    moduleUrl: link,
    canOrderAgain: z.boolean(),
  }),
  /** Subject: the order; version counts the times it was offered a place. */
  place_free: z.strictObject({
    ...ofOrder,
    ...money,
    depositMinor: amountMinor,
    payUrl: link,
    holdUntil: instant,
  }),
} as const
