import { z } from 'zod'
import {
  amountMinor,
  count,
  day,
  instant,
  link,
  money,
  offer,
  oneLine,
  prose,
} from '@/lib/contracts/mail-facts'

/** What people who are interested get: sign-ups, invitations, news. */
export const interestMails = {
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
  /** Subject: the invitation. `opensToAllAt`: end of the head start; null when it is over already. */
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
    opensToAllAt: instant.nullable(),
    takeBackUrl: link,
  }),
  /** Subject: `{update}.{person}`, so that each receiver gets it once whatever they are. */
  run_update: z.strictObject({
    module: oneLine(),
    title: oneLine(),
    text: prose(20_000),
    updateUrl: link,
  }),
} as const
