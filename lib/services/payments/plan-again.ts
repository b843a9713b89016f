import 'server-only'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import type { DueKind } from '@/lib/jobs/due-kinds'
import { setDue } from '@/lib/jobs/set-due'

/** Sets something due for a later instant, because the provider has not answered. Writes: a due row. Repeat: safe. */
export async function planAgain(due: {
  kind: DueKind
  subjectId: string
  workshopId: string | null
  at: Date
}) {
  return inTransaction(async (tx) => {
    const { kind, subjectId, workshopId, at } = due
    await setDue(tx, { kind, subjectId, workshopId, at })
    return ok({})
  })
}
