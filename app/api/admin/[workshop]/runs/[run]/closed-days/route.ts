import { RunParams } from '@/lib/contracts/runs'
import { ClosedDaysInput } from '@/lib/contracts/schedule'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { saveClosedDays } from '@/lib/services/settings/save-closed-days'

export const POST = route(
  {
    deed: 'schedule:write',
    params: RunParams,
    body: ClosedDaysInput,
    form: {
      name: 'closed-days',
      back: ({ params, draft }) =>
        `${paths.adminRunPage(params.workshop, params.run, 'schedule')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminRunPage(params.workshop, params.run, 'schedule')}?saved=1`,
    },
  },
  ({ actor, workshop, body }) => saveClosedDays({ actor, workshopId: workshop.id, days: body.days }),
)
