import { ChoiceInput } from '@/lib/contracts/choice-forms'
import { ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { addChoice } from '@/lib/services/modules/add-choice'

export const POST = route(
  {
    deed: 'choice:write',
    params: ModuleParams,
    body: ChoiceInput,
    form: {
      name: 'choice',
      back: ({ params, body, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'offers')}?offer=${String(body.offer)}&draft=${draft}#choices`,
      done: ({ params, body }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'offers')}?offer=${body.offer}&saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    addChoice({ actor, workshopId: workshop.id, module: params.module, input: body, now }),
)
