import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { DestinationInput } from '@/lib/contracts/settings'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { saveDestination } from '@/lib/services/settings/save-destination'

export const POST = route(
  {
    deed: 'destination:write',
    params: z.object({ workshop: slug }),
    body: DestinationInput,
    form: {
      name: 'destination',
      back: ({ params, draft }) =>
        `${paths.adminSettingsPage(params.workshop, 'destinations')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminSettingsPage(params.workshop, 'destinations')}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) => saveDestination({ actor, workshopId: workshop.id, input: body, now }),
)
