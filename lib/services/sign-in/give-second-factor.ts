import 'server-only'
import { verifySync } from 'otplib'
import type { Transaction } from 'sequelize'
import { hashToken, recoveryCodesOf, unseal } from '@/lib/config/secrets'
import { refuseFields } from '@/lib/contracts/problem'
import type { Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { secondFactorWords } from '@/lib/messages/second-factor'
import { RecoveryCode, Session, User } from '@/models'

/**
 * Takes a code of six digits, or a recovery code, and marks this session. The first code proves that the secret was
 * copied and makes the recovery codes good. A code is good for its half minute and the ones beside it, and
 * never twice (RFC 6238, section 5.2). Time is real time, as the authenticator's is.
 * Refuses: not_found · invalid (code). Locks: the user. Writes: the last step, the session, recovery codes.
 * Repeat: the same code is refused.
 */
export function giveSecondFactor(cmd: {
  actor: Extract<Actor, { kind: 'person' }>
  sessionToken: string
  code: string
  now: Date
}) {
  return inTransaction(async (tx) => {
    const user = await User.findOne({
      where: { personId: cmd.actor.personId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!user?.totpSecretEncrypted) return refuse('not_found')
    const isGood = /^\d{6}$/.test(cmd.code)
      ? await useCode(user, cmd.code, tx)
      : await useRecovery(user, cmd, tx)
    if (!isGood) return refuseFields({ code: secondFactorWords.wrong })
    const isFirst = user.totpConfirmedAt === null
    if (isFirst) await user.update({ totpConfirmedAt: cmd.now }, { transaction: tx })
    await Session.update(
      { secondFactorAt: new Date() },
      { where: { tokenHash: hashToken(cmd.sessionToken), userId: user.id }, transaction: tx },
    )
    if (isFirst) await keepRecoveryCodes(user, cmd.now, tx)
    return ok({ given: true as const })
  })
}

async function useCode(user: User, code: string, tx: Transaction): Promise<boolean> {
  const checked = verifySync({
    secret: unseal(user.totpSecretEncrypted!),
    token: code,
    epochTolerance: 30,
    ...(user.totpLastStep !== null && { afterTimeStep: user.totpLastStep }),
  })
  if (!checked.valid) return false
  await user.update({ totpLastStep: (checked as { timeStep: number }).timeStep }, { transaction: tx })
  return true
}

async function useRecovery(user: User, cmd: { code: string; now: Date }, tx: Transaction): Promise<boolean> {
  const codeHash = hashToken(cmd.code.toLowerCase())
  const [used] = await RecoveryCode.update(
    { usedAt: cmd.now },
    { where: { userId: user.id, codeHash, usedAt: null }, transaction: tx },
  )
  return used === 1
}

/** The codes the set-up page showed beside the secret, kept as hashes once the secret is proven. */
async function keepRecoveryCodes(user: User, now: Date, tx: Transaction): Promise<void> {
  const codes = recoveryCodesOf(unseal(user.totpSecretEncrypted!))
  await RecoveryCode.bulkCreate(
    codes.map((code) => ({ userId: user.id, codeHash: hashToken(code), createdAt: now, usedAt: null })),
    { transaction: tx },
  )
}
