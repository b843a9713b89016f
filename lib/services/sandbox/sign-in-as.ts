import 'server-only'
import { env } from '@/lib/config/env'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { findOrAddPerson } from '@/lib/services/_steps/find-or-add-person'
import { Session, User } from '@/models'

/** How lib/auth/actor knows a session made here; its second factor counts as given. */
const DEVICE = 'sandbox'
const LASTS_SECONDS = 30 * 24 * 3600

/**
 * Opens a session for a demo person or a new customer, without a mail. Sandbox only.
 * Refuses: not_found outside the sandbox. Locks: nothing. Writes: person and user when new, a session. Repeat: another
 * session.
 */
export async function signInAs({ email, now }: { email: string; now: Date }) {
  if (!env().SANDBOX) return refuse('not_found')
  const token = makeToken()
  return inTransaction(async (tx) => {
    const person = await findOrAddPerson(tx, email, now)
    const [user] = await User.findOrCreate({
      where: { personId: person.id },
      defaults: { personId: person.id, createdAt: now, emailVerifiedAt: now },
      transaction: tx,
    })
    await Session.create(
      {
        userId: user.id,
        tokenHash: hashToken(token),
        createdAt: now,
        // Sessions end by real time, as everywhere.
        expiresAt: new Date(Date.now() + LASTS_SECONDS * 1000),
        device: DEVICE,
      },
      { transaction: tx },
    )
    return ok({ token, email: person.emailNormal ?? email, seconds: LASTS_SECONDS })
  })
}
