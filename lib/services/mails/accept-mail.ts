import 'server-only'
import { Op } from 'sequelize'
import { refuse } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { moveMail } from '@/lib/services/_steps/move-mail'
import { MailOutbox, Person } from '@/models'

type Kept = { subject: string; text: string; html: string }

/**
 * Records that the mail server took a mail; from now on its secret links are forgotten and its text is kept without
 * them. An address that bounced before counts as good again.
 * Refuses: not_found · not_allowed (it is not being sent). Locks: the mail. Repeat: refused, nothing changes.
 */
export async function acceptMail({ mailId, kept, now }: { mailId: string; kept: Kept; now: Date }) {
  crashPoint('mail_accepted')
  const accepted = await inTransaction(async (tx) => {
    const mail = await MailOutbox.findByPk(mailId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!mail) return refuse('not_found')
    const wasBouncing = { id: mail.personId, mailBouncedAt: { [Op.ne]: null } }
    await Person.update({ mailBouncedAt: null }, { where: wasBouncing, transaction: tx })
    return moveMail(tx, mail, 'accept', now, {
      sentAt: now,
      secrets: null,
      lastError: null,
      subjectLine: kept.subject,
      bodyText: kept.text,
      bodyHtml: kept.html,
    })
  })
  crashPoint('mail_sent')
  return accepted
}
