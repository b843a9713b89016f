import { z } from 'zod'
import {
  amountMinor,
  balanceWhen,
  count,
  day,
  link,
  money,
  ofOrder,
  offer,
  offerPromise,
  prose,
} from '@/lib/contracts/mail-facts'

/** What happens to a whole run, told to each order of it. */
export const runMails = {
  /** Subject: the order. `belowMinimum`: the written reason when the run was locked below its minimum. */
  run_locked: z.strictObject({
    ...ofOrder,
    ...money,
    deposited: count,
    minimum: count,
    belowMinimum: prose(2000).nullable(),
    balanceMinor: amountMinor,
    balanceWhen,
    promises: z.array(offerPromise).min(1),
  }),
  /** Subject: the order. `cause` `clock`: nobody decided in time. */
  run_called_off: z.strictObject({
    ...ofOrder,
    ...money,
    cause: z.enum(['owner', 'clock']),
    reason: prose(2000).nullable(),
    refundMinor: amountMinor,
  }),
  /**
   * Subject: the order; version: counts the changes of the run. Exactly one of `minimum` and `decideBy` is what changed.
   */
  run_changed: z.union([
    z.strictObject({
      ...ofOrder,
      minimum: z.strictObject({ from: count, to: count }),
      decideBy: z.null(),
      deposited: count,
      isWaiting: z.boolean(),
    }),
    z.strictObject({
      ...ofOrder,
      minimum: z.null(),
      decideBy: z.strictObject({ from: day, to: day, callsOffOn: day }),
      deposited: count,
      isWaiting: z.boolean(),
    }),
  ]),
  /**
   * Subject: the notice's answer row, one per order. `occasion` `broken_promise` is the mail of the day on which a
   * promise passed without a notice. `silenceMeans`, `answerBy` and `refundBy` are those of `delayRule`.
   */
  delay_notice: z.strictObject({
    ...ofOrder,
    ...money,
    occasion: z.enum(['delay', 'broken_promise']),
    delays: z.array(z.strictObject({ offer, promisedBy: day, revisedBy: day.nullable() })).min(1),
    reason: prose(4000).nullable(),
    silenceMeans: z.enum(['wait', 'cancel']),
    answerBy: day.nullable(),
    refundMinor: amountMinor,
    refundBy: day.nullable(),
    noticeUrl: link,
  }),
  /** Subject: the notice's answer row. Something stated on the page changed; cancelling is free. */
  change_notice: z.strictObject({
    ...ofOrder,
    ...money,
    what: z.enum(['revision', 'part', 'decide_by', 'minimum', 'other']),
    text: prose(4000),
    answerBy: day.nullable(),
    refundMinor: amountMinor,
    noticeUrl: link,
  }),
} as const
