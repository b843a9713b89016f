import { z } from 'zod'
import { count, day, link, offer, oneLine } from '@/lib/contracts/mail-facts'

/** Signing in and working for a workshop. */
export const peopleMails = {
  /** Subject: the sign-in token's own id (never the token). No workshop. */
  sign_in_link: z.strictObject({ signInUrl: link, validMinutes: z.int().positive() }),
  /** Subject: the invitation to the membership. */
  staff_invitation: z.strictObject({
    role: z.enum(['owner', 'bench', 'packer']),
    invitedBy: oneLine(),
    acceptUrl: link,
    validUntil: day,
  }),
  /** Subject: run, owner and what it is about; version: days since 1970 of the reminder's day. */
  owner_reminder: z.strictObject({
    module: oneLine(),
    number: z.int().positive(),
    about: z.enum(['decide_by', 'posted_by']),
    offer: offer.nullable(),
    on: day,
    /** Below zero once it has passed. */
    daysLeft: z.int(),
    deposited: count,
    minimum: count,
    callsOffOn: day.nullable(),
    runUrl: link,
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
            'parts_late',
            'disputes',
          ]),
          count: z.int().positive(),
          url: link,
        }),
      )
      .min(1),
  }),
} as const
