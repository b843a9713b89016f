import 'server-only'
import type { Transaction } from 'sequelize'
import type { BulkKind } from '@/lib/contracts/bulk'
import { enqueue } from '@/lib/jobs/enqueue'
import { BulkItem, BulkJob, type Run } from '@/models'

type Wanted = {
  kind: BulkKind
  run: Run
  subjectIds: readonly string[]
  params?: Record<string, unknown>
  /** Null when the clock ordered it. */
  byPersonId: string | null
  now: Date
}

/**
 * Promises a deed on many rows: one item each, worked one by one by a job that can be killed and goes on where it was.
 * Locks: nothing. Writes: the bulk job, its items, one job of the queue. Repeat: makes another.
 */
export async function startBulk(tx: Transaction, wanted: Wanted): Promise<BulkJob> {
  const { run, kind, now } = wanted
  const subjects = [...new Set(wanted.subjectIds)]
  const job = await BulkJob.create(
    {
      workshopId: run.workshopId,
      kind,
      runId: run.id,
      params: wanted.params ?? {},
      createdAt: now,
      byPersonId: wanted.byPersonId,
      doneAt: subjects.length === 0 ? now : null,
    },
    { transaction: tx },
  )
  if (subjects.length === 0) return job
  await BulkItem.bulkCreate(
    subjects.map((subjectId, position) => ({
      workshopId: run.workshopId,
      bulkJobId: job.id,
      subjectId,
      position,
      doneAt: null,
      reason: null,
    })),
    { transaction: tx },
  )
  await enqueue(tx, 'run_bulk', { bulkId: job.id }, { key: `run_bulk:${job.id}` })
  return job
}
