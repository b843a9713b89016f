import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { fillQueue } from '@/lib/services/packing/fill-queue'

export const POST = route(
  {
    deed: 'parcel:open',
    params: z.object({ workshop: slug }),
    form: {
      name: 'fill-queue',
      back: ({ params }) => paths.packing(params.workshop),
      done: ({ params }) => paths.packing(params.workshop),
    },
  },
  ({ actor, workshop, now }) => fillQueue({ actor, workshopId: workshop.id, now }),
)
