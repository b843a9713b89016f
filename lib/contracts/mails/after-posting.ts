import { z } from 'zod'
import {
  amountMinor,
  cardEnding,
  day,
  instant,
  link,
  mailLine,
  money,
  ofOrder,
  oneLine,
  prose,
} from '@/lib/contracts/mail-facts'

const REFUND_CAUSES = [
  'cancelled',
  'withdrawn',
  'run_called_off',
  'late_capture',
  'surplus',
  'order_change',
  'lapsed',
  'problem',
  'notice',
  'postage',
  'price_fell',
  'owner',
] as const

/** Withdrawal and a called-off run have mails of their own. */
const CANCEL_CAUSES = [
  'customer',
  'owner',
  'notice',
  'silence',
  'broken_promise',
  'run_closed',
  'left_queue',
] as const

/** Parcels, problems, and money that goes back. */
export const afterPostingMails = {
  /** Subject: the parcel. `tracking` null: a service without a number. */
  parcel_handed_over: z.strictObject({
    ...ofOrder,
    lines: z.array(mailLine).min(1),
    service: oneLine(),
    tracking: oneLine(60).nullable(),
    trackingUrl: link.nullable(),
    handedOverOn: day,
    more: z.boolean(),
    isReplacement: z.boolean(),
    crossesCustoms: z.boolean(),
    problemUrl: link,
  }),
  /** Subject: the problem. */
  problem_opened: z.strictObject({
    ...ofOrder,
    what: z.enum(['missing_part', 'fault', 'wrong', 'damaged', 'lost', 'other']),
    answerBy: day.nullable(),
    problemUrl: link,
  }),
  /** Subject: the problem; version: the answer's number. */
  problem_answered: z.strictObject({
    ...ofOrder,
    ...money,
    answer: z.enum(['part', 'replacement', 'repair', 'part_refund', 'full_refund', 'message']),
    text: prose(10_000),
    refundMinor: amountMinor,
    problemUrl: link,
  }),
  /** Subject: the order. `returnTo` null: nothing was posted yet, so nothing comes back. */
  withdrawal_acknowledged: z.strictObject({
    ...ofOrder,
    ...money,
    receivedAt: instant,
    refundMinor: amountMinor,
    refundBy: day,
    returnTo: z.array(oneLine()).min(1).max(12).nullable(),
    returnBy: day.nullable(),
  }),
  /** Subject: the refund. */
  refund_sent: z.strictObject({
    ...ofOrder,
    ...money,
    amountMinor,
    cause: z.enum(REFUND_CAUSES),
    cardEnding,
  }),
  /** Subject: the order. */
  order_cancelled: z.strictObject({
    ...ofOrder,
    ...money,
    cause: z.enum(CANCEL_CAUSES),
    reason: prose(2000).nullable(),
    refundMinor: amountMinor,
  }),
} as const
