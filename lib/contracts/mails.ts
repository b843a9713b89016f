import type { z } from 'zod'
import { afterPostingMails } from '@/lib/contracts/mails/after-posting'
import { balanceMails } from '@/lib/contracts/mails/balance'
import { depositsMails } from '@/lib/contracts/mails/deposits'
import { interestMails } from '@/lib/contracts/mails/interest'
import { peopleMails } from '@/lib/contracts/mails/people'
import { runMails } from '@/lib/contracts/mails/run'

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
  ...interestMails,
  ...depositsMails,
  ...runMails,
  ...balanceMails,
  ...afterPostingMails,
  ...peopleMails,
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
