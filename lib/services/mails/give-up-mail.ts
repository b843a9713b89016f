import 'server-only'
import { refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moveMail } from '@/lib/services/_steps/move-mail'
import { MailOutbox, Person } from '@/models'

/**
 * Records that a mail will not be sent: its address was refused for good, it could not be put together safely, or
 * every try failed. A refused address marks the person, so that nothing lapses over unanswered mails.
 * Refuses: not_found · not_allowed (it is not being sent). Locks: the mail. Repeat: refused, nothing changes.
 */
export async function giveUpMail(cmd: {
  mailId: string
  error: string
  isAddressRefused: boolean
  now: Date
}) {
  return inTransaction(async (tx) => {
    const mail = await MailOutbox.findByPk(cmd.mailId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!mail) return refuse('not_found')
    if (cmd.isAddressRefused) {
      await Person.update({ mailBouncedAt: cmd.now }, { where: { id: mail.personId }, transaction: tx })
    }
    return moveMail(tx, mail, 'give_up', cmd.now, { endedAt: cmd.now, secrets: null, lastError: cmd.error })
  })
}
