import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { MembershipInput } from '@/lib/contracts/settings'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { removeMember } from '@/lib/services/members/remove-member'

export const POST = route(
  {
    deed: 'member:remove',
    params: z.object({ workshop: slug }),
    body: MembershipInput,
    form: {
      name: 'settings-deed',
      back: ({ params, draft }) => `${paths.adminSettingsPage(params.workshop, 'members')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminSettingsPage(params.workshop, 'members')}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) =>
    removeMember({ actor, workshopId: workshop.id, membership: body.membership, now }),
)
