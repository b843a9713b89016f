import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { QueueQuery } from '@/lib/contracts/packing'
import { ok } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'

export const GET = route(
  { deed: 'packing:read', params: z.object({ workshop: slug }), query: QueueQuery },
  async ({ actor, workshop, query }) => ok(await listPackQueue({ actor, workshopId: workshop.id, query })),
)
