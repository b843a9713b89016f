import 'server-only'
import { generateSecret, generateURI } from 'otplib'
import { recoveryCodesOf, seal, unseal } from '@/lib/config/secrets'
import type { Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { User } from '@/models'

/**
 * The secret an authenticator copies, made on the first look and the same until a first code proves the copy; after
 * that it is never shown again.
 * Refuses: not_found. Locks: the user. Writes: the sealed secret, once. Repeat: safe.
 */
export function setUpSecondFactor(cmd: { actor: Extract<Actor, { kind: 'person' }> }) {
  return inTransaction(async (tx) => {
    const user = await User.findOne({
      where: { personId: cmd.actor.personId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!user) return refuse('not_found')
    if (user.totpConfirmedAt !== null)
      return ok({ confirmed: true as const, secret: null, uri: null, recoveryCodes: [] })
    const secret = user.totpSecretEncrypted === null ? generateSecret() : unseal(user.totpSecretEncrypted)
    if (user.totpSecretEncrypted === null)
      await user.update({ totpSecretEncrypted: seal(secret) }, { transaction: tx })
    return ok({
      confirmed: false as const,
      secret,
      recoveryCodes: recoveryCodesOf(secret),
      uri: generateURI({ issuer: 'Brimline', label: cmd.actor.email, secret }),
    })
  })
}
