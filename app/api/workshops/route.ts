import { WorkshopInput } from '@/lib/contracts/workshops'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { startWorkshop } from '@/lib/services/workshops/start-workshop'

export const POST = route(
  {
    deed: 'workshop:start',
    body: WorkshopInput,
    status: 201,
    form: {
      name: 'workshop',
      back: ({ draft }) => `${paths.start}?draft=${draft}`,
      done: ({ value }) => paths.admin((value as { workshop: string }).workshop),
    },
  },
  ({ actor, body, now }) => startWorkshop({ actor, input: body, now }),
)
