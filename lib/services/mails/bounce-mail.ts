import 'server-only'
import { refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moveMail } from '@/lib/services/_steps/move-mail'
import { MailOutbox, Person } from '@/models'

/**
 * Records that a mail the server had taken came back later; found by its Message-ID, as a delivery report names it.
 * Marks the person, so that nothing lapses over unanswered mails.
 * Refuses: not_found · not_allowed (it was not sent, or had bounced already). Locks: the mail. Repeat: refused,
 * nothing changes.
 */
export async function bounceMail({
  messageId,
  report,
  now,
}: {
  messageId: string
  report: string
  now: Date
}) {
  return inTransaction(async (tx) => {
    const mail = await MailOutbox.findOne({ where: { messageId }, transaction: tx, lock: tx.LOCK.UPDATE })
    if (!mail) return refuse('not_found')
    const moved = await moveMail(tx, mail, 'bounce', now, { endedAt: now, lastError: report.slice(0, 500) })
    if (moved.ok) {
      await Person.update({ mailBouncedAt: now }, { where: { id: mail.personId }, transaction: tx })
    }
    return moved
  })
}
