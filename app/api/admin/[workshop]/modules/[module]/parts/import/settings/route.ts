import { ModuleParams } from '@/lib/contracts/module-forms'
import { ImportSettings } from '@/lib/contracts/part-import'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { setImport } from '@/lib/services/part-imports/set-import'

export const POST = route(
  {
    deed: 'part:import',
    params: ModuleParams,
    body: ImportSettings,
    form: {
      name: 'part-import-settings',
      back: ({ params, body, draft }) =>
        paths.adminPartImport(params.workshop, params.module, { import: String(body.import), draft }),
      done: ({ params, body }) =>
        paths.adminPartImport(params.workshop, params.module, { import: body.import }),
    },
  },
  ({ actor, workshop, body }) => setImport({ actor, workshopId: workshop.id, input: body }),
)
