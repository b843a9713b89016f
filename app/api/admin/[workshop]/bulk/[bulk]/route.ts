import { type BulkProgress, BulkParams } from '@/lib/contracts/runs'
import { ok, refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { getBulk } from '@/lib/queries/bulk/get-bulk'

export const GET = route({ deed: 'bulk:read', params: BulkParams }, async ({ actor, workshop, params }) => {
  const bulk = await getBulk({ actor, workshopId: workshop.id, bulkId: params.bulk })
  if (!bulk) return refuse('not_found')
  const { total, done, failed } = bulk
  return ok({ total, done, failed } satisfies BulkProgress)
})
