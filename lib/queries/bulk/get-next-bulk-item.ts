import 'server-only'
import { Op } from 'sequelize'
import type { BulkKind } from '@/lib/contracts/bulk'
import { BulkItem, BulkJob } from '@/models'

/** The next row of a bulk job that waits, in its order, passing over those named; null when none is left. */
export async function getNextBulkItem(cmd: {
  bulkId: string
  passedOver: readonly string[]
}): Promise<{ id: string; subjectId: string; kind: BulkKind } | null> {
  const item = await BulkItem.findOne({
    where: { bulkJobId: cmd.bulkId, state: 'waiting', id: { [Op.notIn]: [...cmd.passedOver] } },
    include: [{ model: BulkJob, as: 'job', required: true }],
    order: [['position', 'ASC']],
  })
  return item?.job ? { id: item.id, subjectId: item.subjectId, kind: item.job.kind as BulkKind } : null
}
