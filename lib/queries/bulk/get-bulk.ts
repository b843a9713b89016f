import 'server-only'
import { QueryTypes } from 'sequelize'
import type { BulkView } from '@/lib/contracts/run-page'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { BulkJob } from '@/models'

type Row = { state: 'waiting' | 'done' | 'failed'; reason: string | null; count: number; subject: string }

/**
 * How far a deed on many rows is: n of m counted from its items, and why some did not succeed. Null when the actor may not
 * see it. Two statements.
 */
export async function getBulk(cmd: {
  actor: Actor
  workshopId: string
  bulkId: string
}): Promise<BulkView | null> {
  const { actor, workshopId, bulkId } = cmd
  if (!can(actor, 'bulk:read', { workshopId })) return null
  const job = await BulkJob.findOne({ where: { id: bulkId, workshopId } })
  if (!job) return null
  const rows = await sequelize.query<Row>(
    `select state, reason, count(*)::int as count, min(subject_id::text) as subject
     from bulk_items where bulk_job_id = $bulkId group by 1, 2`,
    { bind: { bulkId }, type: QueryTypes.SELECT },
  )
  const counted = (state?: Row['state']) =>
    rows.filter((row) => !state || row.state === state).reduce((sum, { count }) => sum + count, 0)
  return {
    id: job.id,
    kind: job.kind,
    run: job.runId,
    total: counted(),
    done: counted('done'),
    failed: counted('failed'),
    failures: rows
      .filter(({ state }) => state === 'failed')
      .map(({ reason, count, subject }) => ({ subject, reason: reason ?? 'refused', count })),
  }
}
