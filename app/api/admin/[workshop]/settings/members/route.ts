import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { MemberInput } from '@/lib/contracts/settings'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { inviteMember } from '@/lib/services/members/invite-member'

export const POST = route(
  {
    deed: 'member:invite',
    params: z.object({ workshop: slug }),
    body: MemberInput,
    form: {
      name: 'member',
      back: ({ params, draft }) => `${paths.adminSettingsPage(params.workshop, 'members')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminSettingsPage(params.workshop, 'members')}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) => inviteMember({ actor, workshopId: workshop.id, input: body, now }),
)
