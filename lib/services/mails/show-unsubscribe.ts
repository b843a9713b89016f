import 'server-only'
import { ok, refuse, type Result } from '@/lib/core/result'
import { mailOfUnsubscribeToken } from '@/lib/services/_steps/unsubscribe-token'
import { MailOutbox, Workshop } from '@/models'

/**
 * Whose mails an unsubscribing link would end, for the page that asks first; null where the mail is of no workshop.
 * Refuses: unknown_link. Locks: nothing. Writes: nothing.
 */
export async function showUnsubscribe(cmd: {
  token: string
}): Promise<Result<{ workshop: string | null }, 'unknown_link'>> {
  const mailId = mailOfUnsubscribeToken(cmd.token)
  if (!mailId.ok) return mailId
  const mail = await MailOutbox.findByPk(mailId.value, { attributes: ['workshopId'] })
  if (!mail) return refuse('unknown_link')
  const workshop = mail.workshopId && (await Workshop.findByPk(mail.workshopId, { attributes: ['name'] }))
  return ok({ workshop: workshop ? workshop.name : null })
}
