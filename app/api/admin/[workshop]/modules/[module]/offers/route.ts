import { ModuleParams, OfferInput } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { saveOffer } from '@/lib/services/modules/save-offer'

export const POST = route(
  {
    deed: 'offer:write',
    params: ModuleParams,
    body: OfferInput,
    form: {
      name: 'offer',
      back: ({ params, body, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'offers')}?offer=${String(body.offer)}&draft=${draft}`,
      done: ({ params, body }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'offers')}?offer=${String(body.offer)}&saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    saveOffer({ actor, workshopId: workshop.id, module: params.module, input: body, now }),
)
