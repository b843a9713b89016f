import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { TrackingInput } from '@/lib/contracts/tracking'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { importTracking } from '@/lib/services/packing/import-tracking'

export const POST = route(
  {
    deed: 'tracking:import',
    params: z.object({ workshop: slug }),
    body: TrackingInput,
    form: {
      name: 'tracking',
      back: ({ params, draft }) => `${paths.packingPost(params.workshop)}?draft=${draft}#tracking`,
      done: ({ params }) => `${paths.packingPost(params.workshop)}?saved=tracking`,
    },
  },
  ({ actor, workshop, body, now }) => importTracking({ actor, workshopId: workshop.id, input: body, now }),
)
