import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { PostageInput } from '@/lib/contracts/settings'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { savePostage } from '@/lib/services/settings/save-postage'

export const POST = route(
  {
    deed: 'settings:write',
    params: z.object({ workshop: slug }),
    body: PostageInput,
    form: {
      name: 'postage',
      back: ({ params, draft, body }) =>
        `${paths.adminSettingsPage(params.workshop, 'postage')}?zone=${String(body.zone ?? '')}&draft=${draft}`,
      done: ({ params }) => `${paths.adminSettingsPage(params.workshop, 'postage')}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) => savePostage({ actor, workshopId: workshop.id, input: body, now }),
)
