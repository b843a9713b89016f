import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { UNSUBSCRIBABLE, type MailKind } from '@/lib/contracts/mails'
import { Suppression } from '@/models'

const SCOPES = { deposits_open: 'invitations', run_update: 'updates' } as const

/** Whether somebody asked not to get mails of this kind; what the contract needs is never held back. */
export async function isSuppressed(
  mail: { kind: string; workshopId: string | null; emailHash: string },
  transaction: Transaction,
): Promise<boolean> {
  const kind = UNSUBSCRIBABLE.find((each: MailKind) => each === mail.kind)
  if (!kind) return false
  const found = await Suppression.count({
    where: {
      emailHash: mail.emailHash,
      workshopId: { [Op.or]: [null, mail.workshopId] },
      scope: ['all', SCOPES[kind]],
    },
    transaction,
  })
  return found > 0
}
