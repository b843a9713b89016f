import 'server-only'
import { writeMail } from '@/emails/write-mail'
import { env } from '@/lib/config/env'
import { log } from '@/lib/config/log'
import { type MailProps } from '@/lib/contracts/mails'
import { clock } from '@/lib/gateways/clock'
import { mailer } from '@/lib/gateways/mailer'
import { mailboxOf } from '@/lib/gateways/mailer/sender-address'
import { type Message, type SendFailure } from '@/lib/gateways/mailer/types'
import { type Task } from '@/lib/jobs/task'
import { acceptMail } from '@/lib/services/mails/accept-mail'
import { claimMail, type ClaimedMail } from '@/lib/services/mails/claim-mail'
import { deferMail } from '@/lib/services/mails/defer-mail'
import { giveUpMail } from '@/lib/services/mails/give-up-mail'

/** With pauses that double from 10 s to 6 h, the last try comes some three days after the first. */
const TRIES = 24
const FIRST_PAUSE_S = 10
const LONGEST_PAUSE_S = 6 * 3600

/**
 * Sends one mail of the outbox: take it (or drop it), write it, hand it to the server, record what came of it. Killed
 * between the server's yes and the record, it is sent again under the same Message-ID: at least once.
 */
export const sendMail: Task<'send_mail'> = async ({ mailId }) => {
  const now = await clock.now()
  const claimed = await claimMail({ mailId, now })
  if (!claimed.ok || claimed.value === null) return
  const mail = claimed.value
  const sent = await mailer().send(await messageOf(mail, now))
  if (sent.ok) await acceptMail({ mailId, kept: await keptOf(mail), now })
  else await recordFailure(mail, sent.reason, now)
}

const written = (mail: ClaimedMail, facts: Record<string, unknown>, unsubscribeUrl: string | null) =>
  writeMail(mail.kind, facts as MailProps<typeof mail.kind>, mail.sender, unsubscribeUrl)

/** The text that may be read later, by its receiver and the workshop: links that open something lead to the front. */
const keptOf = (mail: ClaimedMail) => written(mail, mail.keptFacts, mail.unsubscribe && env().BASE_URL)

async function messageOf(mail: ClaimedMail, now: Date): Promise<Message> {
  const { sender, unsubscribe } = mail
  const { subject, html, text } = await written(mail, mail.facts, unsubscribe?.pageUrl ?? null)
  return {
    messageId: mail.messageId,
    from: { name: sender.workshop, address: mailboxOf(env().MAIL_FROM).address },
    replyTo: sender.replyTo ? { name: sender.maker, address: sender.replyTo } : null,
    to: mail.to,
    subject,
    html,
    text,
    unsubscribeUrl: unsubscribe?.postUrl ?? null,
    date: now,
  }
}

async function recordFailure({ id: mailId, kind, attempts }: ClaimedMail, reason: SendFailure, now: Date) {
  const isOver = reason !== 'not_now' || attempts >= TRIES
  log().warn({ mail: mailId, kind, attempts, reason }, isOver ? 'mail given up' : 'mail deferred')
  if (isOver) {
    await giveUpMail({ mailId, error: reason, isAddressRefused: reason === 'address_refused', now })
    return
  }
  const pauseS = Math.min(FIRST_PAUSE_S * 2 ** (attempts - 1), LONGEST_PAUSE_S)
  await deferMail({ mailId, error: reason, retryAt: new Date(Date.now() + pauseS * 1000), now })
}
