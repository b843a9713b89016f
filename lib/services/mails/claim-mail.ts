import 'server-only'
import { fn, type Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import { UNSUBSCRIBABLE, type MailKind, type MailSender } from '@/lib/contracts/mails'
import { ok, refuse } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { paths } from '@/lib/paths'
import { getMailSender } from '@/lib/queries/mails/get-mail-sender'
import { isStillTrue } from '@/lib/queries/mails/is-still-true'
import { isSuppressed } from '@/lib/queries/mails/is-suppressed'
import { moveMail } from '@/lib/services/_steps/move-mail'
import { emailHash, unsubscribeToken } from '@/lib/services/_steps/unsubscribe-token'
import { MailOutbox, Person } from '@/models'

export type ClaimedMail = {
  id: string
  kind: MailKind
  facts: Record<string, unknown>
  /** The same facts with links that lead only to the front: what may be kept. */
  keptFacts: Record<string, unknown>
  to: string
  sender: MailSender
  messageId: string
  /** Tries so far, this one included. */
  attempts: number
  /** The page and the one-click address; null where unsubscribing makes no sense. */
  unsubscribe: { pageUrl: string; postUrl: string } | null
}

/**
 * Takes a queued mail for sending, or drops it when it is no longer true, unwanted, or has no address any more.
 * Refuses: not_found · not_allowed (sent, dropped or given up already). Locks: the mail. Writes: the mail, its audit
 * entries. Repeat: safe; one left in `sending` by a killed worker is taken again under the same Message-ID.
 */
export async function claimMail({ mailId, now }: { mailId: string; now: Date }) {
  const claimed = await inTransaction(async (tx) => {
    const mail = await MailOutbox.findByPk(mailId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!mail) return refuse('not_found')
    if (mail.state === 'sending') await moveMail(tx, mail, 'defer', now)
    const person = await Person.findByPk(mail.personId, { transaction: tx })
    const reason = await whyNot(mail, person, now, tx)
    if (reason !== null) {
      const dropped = await moveMail(tx, mail, 'drop', now, {
        endedAt: now,
        secrets: null,
        lastError: reason,
      })
      return dropped.ok ? ok(null) : dropped
    }
    const moved = await moveMail(tx, mail, 'claim', now, { attempts: mail.attempts + 1 })
    if (!moved.ok) return moved
    await MailOutbox.update({ claimedAt: fn('now') }, { where: { id: mailId }, transaction: tx })
    const to = person?.emailShown ?? person?.emailNormal ?? ''
    return ok(claimedMail(mail, to, await getMailSender(mail.workshopId, tx)))
  })
  crashPoint('mail_claimed')
  return claimed
}

async function whyNot(
  mail: MailOutbox,
  person: Person | null,
  now: Date,
  tx: Transaction,
): Promise<string | null> {
  const { kind, subjectId, workshopId } = mail
  if (!person?.emailNormal) return 'no_address'
  if (await isSuppressed({ kind, workshopId, emailHash: emailHash(person.emailNormal) }, tx))
    return 'unsubscribed'
  return (await isStillTrue({ kind, subjectId, now }, tx)) ? null : 'no_longer_true'
}

function claimedMail(mail: MailOutbox, to: string, sender: MailSender): ClaimedMail {
  const kind = mail.kind as MailKind
  const secrets = mail.secrets ?? {}
  const fronts = Object.entries(secrets).map(([name, url]) => [name, new URL(url).origin] as const)
  const isNews = UNSUBSCRIBABLE.some((each: MailKind) => each === kind)
  return {
    id: mail.id,
    kind,
    facts: { ...mail.props, ...secrets },
    keptFacts: { ...mail.props, ...Object.fromEntries(fronts) },
    to,
    sender,
    messageId: mail.messageId,
    attempts: mail.attempts,
    unsubscribe: isNews ? unsubscribeLinks(mail.id) : null,
  }
}

function unsubscribeLinks(mailId: string) {
  const token = unsubscribeToken(mailId)
  const { BASE_URL } = env()
  return {
    pageUrl: `${BASE_URL}${paths.unsubscribe(token)}`,
    postUrl: `${BASE_URL}${paths.api.unsubscribe(token)}`,
  }
}
