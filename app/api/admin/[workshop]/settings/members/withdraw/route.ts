import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { StaffInvitationInput } from '@/lib/contracts/settings'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { withdrawInvitation } from '@/lib/services/members/withdraw-invitation'

export const POST = route(
  {
    deed: 'member:invite',
    params: z.object({ workshop: slug }),
    body: StaffInvitationInput,
    form: {
      name: 'settings-deed',
      back: ({ params, draft }) => `${paths.adminSettingsPage(params.workshop, 'members')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminSettingsPage(params.workshop, 'members')}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) =>
    withdrawInvitation({ actor, workshopId: workshop.id, invitation: body.invitation, now }),
)
