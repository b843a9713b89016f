import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { TakeBatchInput } from '@/lib/contracts/packing'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { takeBatch } from '@/lib/services/packing/take-batch'

export const POST = route(
  {
    deed: 'batch:take',
    params: z.object({ workshop: slug }),
    body: TakeBatchInput,
    status: 201,
    form: {
      name: 'batch',
      back: ({ params, draft }) => `${paths.packing(params.workshop)}?draft=${draft}`,
      done: ({ params, value }) => paths.packingBatch(params.workshop, (value as { batch: string }).batch),
    },
  },
  ({ actor, workshop, body, now }) => takeBatch({ actor, workshopId: workshop.id, input: body, now }),
)
