import { ChoiceRetirement } from '@/lib/contracts/choice-forms'
import { ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { retireChoice } from '@/lib/services/modules/retire-choice'

export const POST = route(
  {
    deed: 'choice:write',
    params: ModuleParams,
    body: ChoiceRetirement,
    form: {
      name: 'module-deed',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'offers')}?draft=${draft}`,
      done: ({ params, value }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'offers')}?offer=${(value as { offer: string }).offer}&saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    retireChoice({ actor, workshopId: workshop.id, module: params.module, choice: body.choice, now }),
)
