import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { ModuleNewInput } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { createModule } from '@/lib/services/modules/create-module'

export const POST = route(
  {
    deed: 'module:create',
    params: z.object({ workshop: slug }),
    body: ModuleNewInput,
    status: 201,
    form: {
      name: 'module-new',
      back: ({ params, draft }) => `${paths.adminModuleNew(params.workshop)}?draft=${draft}`,
      done: ({ params, body }) => paths.adminModule(params.workshop, body.slug),
    },
  },
  ({ actor, workshop, body, now }) => createModule({ actor, workshopId: workshop.id, input: body, now }),
)
