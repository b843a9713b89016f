import 'server-only'
import { Op } from 'sequelize'
import { LINK_SECONDS } from '@/lib/auth/options'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { env } from '@/lib/config/env'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { paths } from '@/lib/paths'
import { SignInToken } from '@/models'
import { findOrAddPerson } from '../_steps/find-or-add-person'
import { queueMail } from '../_steps/queue-mail'

/** Links one address may have under way; more would let a stranger fill somebody's mailbox. */
const MOST_OPEN = 5

/**
 * Mails a sign-in link to an address, known or not. `askedBy` is the asking browser's secret: opened elsewhere the
 * link shows a code to type here. Links live on real time, like every session.
 * Refuses: too_many. Locks: nothing. Writes: one token (hashed), one mail. Repeat: sends another link.
 */
export function requestSignInLink(cmd: {
  email: string
  next: string | undefined
  askedBy: string
  now: Date
}) {
  return inTransaction(async (tx) => {
    const person = await findOrAddPerson(tx, cmd.email, cmd.now)
    const emailNormal = person.emailNormal!
    const asked = new Date()
    const open = await SignInToken.count({
      where: { emailNormal, expiresAt: { [Op.gt]: asked } },
      transaction: tx,
    })
    if (open >= MOST_OPEN) return refuse('too_many')
    const token = makeToken()
    const row = await SignInToken.create(
      {
        emailNormal,
        tokenHash: hashToken(token),
        askedByHash: hashToken(cmd.askedBy),
        codeHash: null,
        returnTo: cmd.next ?? null,
        createdAt: asked,
        expiresAt: new Date(asked.getTime() + LINK_SECONDS * 1000),
      },
      { transaction: tx },
    )
    await queueMail(tx, {
      kind: 'sign_in_link',
      workshopId: null,
      personId: person.id,
      subjectId: row.id,
      props: { signInUrl: `${env().BASE_URL}${paths.signInLink(token)}`, validMinutes: LINK_SECONDS / 60 },
      now: cmd.now,
    })
    return ok({ sent: true as const })
  })
}
