import 'server-only'
import { type Transaction } from 'sequelize'
import { type Result } from '@/lib/core/result'
import { MAIL_MOVES, next, type MailEvent } from '@/lib/core/states/mail'
import { recordMove } from '@/lib/services/_steps/record-move'
import { type MailOutbox } from '@/models'

/** What a move may set besides the state. */
type MailChange = Partial<
  Pick<
    MailOutbox,
    'attempts' | 'lastError' | 'sentAt' | 'endedAt' | 'secrets' | 'subjectLine' | 'bodyText' | 'bodyHtml'
  >
>

/**
 * Moves a mail the caller has locked, by the table of its states.
 * Refuses: not_allowed. Writes: the row and its audit entry. Repeat: refused, the state has changed.
 */
export async function moveMail(
  tx: Transaction,
  mail: MailOutbox,
  event: MailEvent,
  now: Date,
  change: MailChange = {},
): Promise<Result<MailOutbox, 'not_allowed'>> {
  const from = mail.state
  const to = next(MAIL_MOVES, from, event)
  if (!to.ok) return to
  await mail.update({ ...change, state: to.value }, { transaction: tx })
  await recordMove(tx, {
    workshopId: mail.workshopId,
    subjectType: 'mail',
    subjectId: mail.id,
    from,
    event,
    to: to.value,
    byPersonId: null,
    at: now,
  })
  return { ok: true, value: mail }
}
