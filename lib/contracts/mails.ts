import { z } from 'zod'
import {
  amountMinor,
  cardEnding,
  count,
  currency,
  day,
  instant,
  link,
  mailLine,
  ofOrder,
  offer,
  offerPromise,
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

const balanceWhen = z.enum(['at_lock', 'units_passed', 'before_packing'])
const money = { currency }
const balance = { ...ofOrder, ...money, amountMinor, payUrl: link }

/**
 * The facts of every mail, per kind. Facts only: names, numbers, days, links handed in as absolute addresses, and
 * what a person wrote. The words are in lib/messages/mails.ts; who signs (name, Reply-To, postal address, zone) is
 * read from the workshop when the mail is sent.
 *
 * A mail is unique on (kind, subject, version), so the subject is what there is *one of per receiver*: the order,
 * the sign-up, the invitation, the parcel, the refund, the problem. What repeats on the same subject counts its
 * version up: `balance_reminder` 1–3, `place_free` once per offered place, `problem_answered` per answer.
 */
export const MAILS = {
  /** Subject: the sign-up. `deleteOn`: when an unconfirmed one is deleted. */
  confirm_signup: z.strictObject({
    module: oneLine(),
    offer,
    quantity: z.int().positive(),
    confirmUrl: link,
    deleteOn: day,
  }),
  /** Subject: the sign-up. */
  signup_confirmed: z.strictObject({
    module: oneLine(),
    moduleUrl: link,
    offer,
    quantity: z.int().positive(),
    updates: z.boolean(),
    takeBackUrl: link,
  }),
  /** Subject: the invitation. `opensToAllAt`: end of the head start. */
  deposits_open: z.strictObject({
    ...money,
    module: oneLine(),
    moduleUrl: link,
    offers: z
      .array(z.strictObject({ offer, priceMinor: amountMinor, depositMinor: amountMinor, postedBy: day }))
      .min(1),
    pricesIncludeTax: z.boolean(),
    minimum: count,
    maximum: count,
    decideBy: day,
    opensToAllAt: instant,
    takeBackUrl: link,
  }),
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
  /** Subject: the payment attempt. */
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
  /** Subject: `{update}.{person}`, so that each receiver gets it once whatever they are. */
  run_update: z.strictObject({
    module: oneLine(),
    title: oneLine(),
    text: prose(20_000),
    updateUrl: link,
  }),
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
  /** Subject: the sign-in token's own id (never the token). No workshop. */
  sign_in_link: z.strictObject({ signInUrl: link, validMinutes: z.int().positive() }),
  /** Subject: the invitation to the membership. */
  staff_invitation: z.strictObject({
    role: z.enum(['owner', 'bench', 'packer']),
    invitedBy: oneLine(),
    acceptUrl: link,
    validUntil: day,
  }),
  /** Subject: the membership of the owner; version: days since 1970 of `on`. */
  owner_digest: z.strictObject({
    on: day,
    deskUrl: link,
    settingsUrl: link,
    items: z
      .array(
        z.strictObject({
          what: z.enum([
            'signups',
            'deposits',
            'cancellations',
            'decide_soon',
            'ready_to_lock',
            'balances_failed',
            'problems_open',
            'notices_due',
            'quotes_old',
            'refunds_waiting',
            'parcels_ready',
            'mails_bounced',
            'disputes',
          ]),
          count: z.int().positive(),
          url: link,
        }),
      )
      .min(1),
  }),
} as const

export type MailKind = keyof typeof MAILS
export type MailProps<K extends MailKind> = z.infer<(typeof MAILS)[K]>
export const MAIL_KINDS = Object.keys(MAILS) as MailKind[]

/**
 * News and invitations: only these may be unsubscribed from; the rest is what the contract needs. Their links are
 * made when the mail is sent.
 */
export const UNSUBSCRIBABLE = ['deposits_open', 'run_update'] as const satisfies readonly MailKind[]

/**
 * Links that act for whoever holds them. They are in the outbox only until the mail is sent, so that a stored copy of
 * the table opens nothing.
 */
export const SECRET_LINKS: { readonly [K in MailKind]?: readonly (keyof MailProps<K> & string)[] } = {
  confirm_signup: ['confirmUrl'],
  signup_confirmed: ['takeBackUrl'],
  deposits_open: ['takeBackUrl'],
  sign_in_link: ['signInUrl'],
  staff_invitation: ['acceptUrl'],
}

/** Who signs a mail. Read from the workshop when the mail is sent; Brimline itself where there is no workshop. */
export type MailSender = {
  readonly workshop: string
  readonly maker: string
  readonly replyTo: string | null
  readonly postalAddress: readonly string[]
  readonly timeZone: string
}
