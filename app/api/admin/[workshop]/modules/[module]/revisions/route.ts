import { ModuleParams, RevisionInput } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { createRevision } from '@/lib/services/modules/create-revision'

export const POST = route(
  {
    deed: 'revision:create',
    params: ModuleParams,
    body: RevisionInput,
    form: {
      name: 'revision',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    createRevision({ actor, workshopId: workshop.id, module: params.module, input: body, now }),
)
