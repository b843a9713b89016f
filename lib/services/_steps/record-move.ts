import 'server-only'
import type { Transaction } from 'sequelize'
import { AuditEntry } from '@/models'

type MoveRecord = {
  workshopId: string | null
  subjectType: string
  subjectId: string
  from: string | null
  event: string
  to: string
  byPersonId: string | null
  at: Date
  note?: string
}

/**
 * Writes down who moved what, when and from where, in the transaction of the move itself.
 * Locks: nothing. Writes: one audit entry, never changed afterwards. `note` carries no personal data.
 * Repeat: writes a second entry; the state table is what keeps a move from happening twice.
 */
export async function recordMove(tx: Transaction, move: MoveRecord): Promise<void> {
  const { from, to, note, ...rest } = move
  await AuditEntry.create({ ...rest, fromState: from, toState: to, note: note ?? null }, { transaction: tx })
}
