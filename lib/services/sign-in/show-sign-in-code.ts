import 'server-only'
import { Op } from 'sequelize'
import { codeFor, hashToken } from '@/lib/config/secrets'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { SignInToken } from '@/models'

/**
 * What a mailed link leads to in this browser: the button when it asked for the link, otherwise a short code to type
 * where it was asked. Looking uses nothing up, since mail scanners open links.
 * Refuses: token_unknown · token_expired. Locks: nothing. Writes: the code's hash, once. Repeat: safe.
 */
export function showSignInCode(cmd: { token: string; askedBy: string | undefined }) {
  return inTransaction(async (tx) => {
    const row = await SignInToken.findOne({ where: { tokenHash: hashToken(cmd.token) }, transaction: tx })
    if (!row) return refuse('token_unknown')
    if (row.expiresAt.getTime() <= Date.now()) return refuse('token_expired')
    if (cmd.askedBy !== undefined && row.askedByHash === hashToken(cmd.askedBy))
      return ok({ here: true as const, code: null })
    const code = codeFor(cmd.token)
    await SignInToken.update(
      { codeHash: hashToken(code) },
      { where: { id: row.id, codeHash: { [Op.is]: null } }, transaction: tx },
    )
    return ok({ here: false as const, code })
  })
}
