import 'server-only'
import { QueryTypes } from 'sequelize'
import type { BulkSummary } from '@/lib/contracts/run-page'
import { sequelize } from '@/lib/db/sequelize'

/** The deeds on many rows of a run, newest first, each counted from its items; at most ten. One statement. */
export async function listRunBulk(runId: string): Promise<BulkSummary[]> {
  const rows = await sequelize.query<Omit<BulkSummary, 'createdAt'> & { createdAt: Date }>(
    `select j.id, j.kind, j.created_at as "createdAt", count(i.id)::int as total,
            count(*) filter (where i.state = 'done')::int as done,
            count(*) filter (where i.state = 'failed')::int as failed
     from bulk_jobs j left join bulk_items i on i.bulk_job_id = j.id
     where j.run_id = $runId group by j.id order by j.created_at desc, j.id limit 10`,
    { bind: { runId }, type: QueryTypes.SELECT },
  )
  return rows.map((row) => ({ ...row, createdAt: row.createdAt.toISOString() }))
}
