import 'server-only'
import { refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { enqueue } from '@/lib/jobs/enqueue'
import { moveMail } from '@/lib/services/_steps/move-mail'
import { MailOutbox } from '@/models'

/**
 * Puts a mail back because its server could not take it now, and promises another try. `retryAt` is real time.
 * Refuses: not_found · not_allowed (it is not being sent). Locks: the mail. Repeat: refused, nothing changes.
 */
export async function deferMail(cmd: { mailId: string; error: string; retryAt: Date; now: Date }) {
  return inTransaction(async (tx) => {
    const mail = await MailOutbox.findByPk(cmd.mailId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!mail) return refuse('not_found')
    const moved = await moveMail(tx, mail, 'defer', cmd.now, { lastError: cmd.error })
    if (moved.ok) await enqueue(tx, 'send_mail', { mailId: mail.id }, { runAt: cmd.retryAt })
    return moved
  })
}
