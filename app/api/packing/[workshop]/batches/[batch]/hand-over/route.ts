import { z } from 'zod'
import { slug, uuid } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { handOverPacked } from '@/lib/services/packing/hand-over-packed'

export const POST = route(
  {
    deed: 'parcel:hand_over',
    params: z.object({ workshop: slug, batch: uuid }),
    form: {
      name: 'batch',
      back: ({ params, draft }) => `${paths.packingBatch(params.workshop, params.batch)}?draft=${draft}`,
      done: ({ params }) => paths.packingBatch(params.workshop, params.batch),
    },
  },
  ({ actor, workshop, params, now }) =>
    handOverPacked({ actor, workshopId: workshop.id, batchId: params.batch, now }),
)
