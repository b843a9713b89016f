import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { TermsInput } from '@/lib/contracts/settings'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { publishTerms } from '@/lib/services/settings/publish-terms'

export const POST = route(
  {
    deed: 'terms:write',
    params: z.object({ workshop: slug }),
    body: TermsInput,
    form: {
      name: 'terms',
      back: ({ params, draft }) => `${paths.adminSettingsPage(params.workshop, 'terms')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminSettingsPage(params.workshop, 'terms')}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) => publishTerms({ actor, workshopId: workshop.id, input: body, now }),
)
