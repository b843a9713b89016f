import 'server-only'
import { QueryTypes } from 'sequelize'
import { crashPoint } from '@/lib/db/crash-point'
import { sequelize } from '@/lib/db/sequelize'
import type { DueKind } from './due-kinds'

export type DueRow = { kind: DueKind; subjectId: string; workshopId: string | null; dueAt: Date }

const AT_ONCE = 1000

/** What has fallen due by `now` and is not done, oldest first, at most a thousand at once. */
export async function listDue(now: Date): Promise<DueRow[]> {
  return sequelize.query<DueRow>(
    `select kind, subject_id as "subjectId", workshop_id as "workshopId", due_at as "dueAt" from due_items
     where done_at is null and due_at <= :now order by due_at, kind, subject_id limit ${AT_ONCE}`,
    { replacements: { now: now.toISOString() }, type: QueryTypes.SELECT },
  )
}

/** Ticks one off, unless its handler has set it again for a later instant. */
export async function markDone(item: DueRow, now: Date): Promise<void> {
  crashPoint('due_handled')
  await sequelize.query(
    `update due_items set done_at = :now
     where kind = :kind and subject_id = :subjectId and done_at is null and date_trunc('milliseconds', due_at) <= :dueAt`,
    {
      replacements: {
        kind: item.kind,
        subjectId: item.subjectId,
        now: now.toISOString(),
        dueAt: item.dueAt.toISOString(),
      },
    },
  )
}

/** Writes down that its handler failed, for whoever looks why it is still open. */
export async function markFailed(item: DueRow, error: unknown): Promise<void> {
  const lastError = (error instanceof Error ? error.message : String(error)).slice(0, 500)
  await sequelize.query(
    `update due_items set attempts = attempts + 1, last_error = :lastError
     where kind = :kind and subject_id = :subjectId and done_at is null`,
    { replacements: { kind: item.kind, subjectId: item.subjectId, lastError } },
  )
}
