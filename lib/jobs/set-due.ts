import 'server-only'
import type { Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import type { DueKind } from './due-kinds'

/**
 * Writes down that something about a row falls due at an instant of business time. Set again, it moves:
 * there is one per kind and subject.
 */
export async function setDue(
  tx: Transaction,
  due: { kind: DueKind; subjectId: string; workshopId: string | null; at: Date },
): Promise<void> {
  await sequelize.query(
    `insert into due_items (kind, subject_id, workshop_id, due_at) values (:kind, :subjectId, :workshopId, :at)
     on conflict (kind, subject_id) do update set due_at = excluded.due_at, done_at = null, attempts = 0, last_error = null`,
    { replacements: { ...due, at: due.at.toISOString() }, transaction: tx },
  )
}

/** Takes it off again: what was to happen no longer can. Nothing there is fine. */
export async function dropDue(tx: Transaction, kind: DueKind, subjectId: string): Promise<void> {
  await sequelize.query(
    'delete from due_items where kind = :kind and subject_id = :subjectId and done_at is null',
    {
      replacements: { kind, subjectId },
      transaction: tx,
    },
  )
}
