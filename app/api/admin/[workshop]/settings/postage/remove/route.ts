import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { ZoneInput } from '@/lib/contracts/settings'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { removePostageZone } from '@/lib/services/settings/remove-postage-zone'

export const POST = route(
  {
    deed: 'settings:write',
    params: z.object({ workshop: slug }),
    body: ZoneInput,
    form: {
      name: 'settings-deed',
      back: ({ params, draft }) => `${paths.adminSettingsPage(params.workshop, 'postage')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminSettingsPage(params.workshop, 'postage')}?saved=1`,
    },
  },
  ({ actor, workshop, body }) => removePostageZone({ actor, workshopId: workshop.id, zone: body.zone }),
)
