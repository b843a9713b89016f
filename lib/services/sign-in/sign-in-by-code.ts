import 'server-only'
import { Op } from 'sequelize'
import { adapter } from '@/lib/auth/adapter'
import { SESSION_SECONDS } from '@/lib/auth/options'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { ok, refuse } from '@/lib/core/result'
import { SignInToken } from '@/models'

/** Wrong codes allowed per link: a guess has five chances in a million. */
const MOST_TRIES = 5

/**
 * Signs in the browser that asked for a link, by the code that the link showed elsewhere. The link is used up with it.
 * Refuses: wrong_code (also when there is no such link, or after five wrong codes). Locks: nothing; deleting the row
 * is using it. Writes: a session. Repeat: the second time finds no link.
 */
export async function signInByCode(cmd: { askedBy: string | undefined; code: string }) {
  if (cmd.askedBy === undefined) return refuse('wrong_code')
  const mine = {
    askedByHash: hashToken(cmd.askedBy),
    expiresAt: { [Op.gt]: new Date() },
    codeTries: { [Op.lt]: MOST_TRIES },
  }
  const row = await SignInToken.findOne({ where: { ...mine, codeHash: hashToken(cmd.code) } })
  const used = row ? await SignInToken.destroy({ where: { id: row.id } }) : 0
  if (!row || used === 0) {
    await SignInToken.increment('codeTries', { where: mine })
    return refuse('wrong_code')
  }
  const user =
    (await adapter.getUserByEmail!(row.emailNormal)) ??
    (await adapter.createUser!({ email: row.emailNormal, emailVerified: new Date() }))
  const token = makeToken()
  await adapter.createSession!({
    sessionToken: token,
    userId: user.id,
    expires: new Date(Date.now() + SESSION_SECONDS * 1000),
  })
  return ok({ token, returnTo: row.returnTo })
}
