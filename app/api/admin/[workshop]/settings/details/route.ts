import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { DetailsInput } from '@/lib/contracts/settings'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { saveWorkshopDetails } from '@/lib/services/settings/save-workshop-details'

export const POST = route(
  {
    deed: 'settings:write',
    params: z.object({ workshop: slug }),
    body: DetailsInput,
    form: {
      name: 'details',
      back: ({ params, draft }) => `${paths.adminSettings(params.workshop)}?draft=${draft}`,
      done: ({ params }) => `${paths.adminSettings(params.workshop)}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) =>
    saveWorkshopDetails({ actor, workshopId: workshop.id, input: body, now }),
)
