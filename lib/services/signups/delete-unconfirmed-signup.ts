import 'server-only'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { SignUp } from '@/models'

/** Deletes a sign-up that nobody confirmed in time. Refuses: nothing. Locks: the row. Repeat: safe; a confirmed one stays. */
export function deleteUnconfirmedSignUp(cmd: { signUpId: string }) {
  return inTransaction(async (tx) => {
    const deleted = await SignUp.destroy({
      where: { id: cmd.signUpId, state: 'unconfirmed' },
      transaction: tx,
    })
    return ok({ deleted: deleted === 1 })
  })
}
