import 'server-only'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { emailHash, mailOfUnsubscribeToken } from '@/lib/services/_steps/unsubscribe-token'
import { MailOutbox, Person, Suppression } from '@/models'

/**
 * Ends a workshop's news and invitations for the person a mail went to; what an order needs still comes. Works without
 * signing in and for the one-click POST of RFC 8058.
 * Refuses: unknown_link. Locks: nothing. Writes: one suppression, under the hash of the address. Repeat: safe.
 */
export async function unsubscribe({ token, now }: { token: string; now: Date }) {
  const mailId = mailOfUnsubscribeToken(token)
  if (!mailId.ok) return mailId
  return inTransaction(async (tx) => {
    const mail = await MailOutbox.findByPk(mailId.value, { transaction: tx })
    const person = mail && (await Person.findByPk(mail.personId, { transaction: tx }))
    if (!mail || !person) return refuse('unknown_link')
    if (person.emailNormal === null) return ok({ workshopId: mail.workshopId })
    const row = {
      emailHash: emailHash(person.emailNormal),
      workshopId: mail.workshopId,
      scope: 'all' as const,
    }
    await Suppression.bulkCreate([{ ...row, cause: 'unsubscribed', at: now }], {
      ignoreDuplicates: true,
      transaction: tx,
    })
    return ok({ workshopId: mail.workshopId })
  })
}
