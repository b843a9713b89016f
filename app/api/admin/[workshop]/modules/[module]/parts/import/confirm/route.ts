import { ModuleParams } from '@/lib/contracts/module-forms'
import { ImportConfirm } from '@/lib/contracts/part-import'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { confirmImport } from '@/lib/services/part-imports/confirm-import'

export const POST = route(
  {
    deed: 'part:import',
    params: ModuleParams,
    body: ImportConfirm,
    form: {
      name: 'module-deed',
      back: ({ params, body, draft }) =>
        paths.adminPartImport(params.workshop, params.module, { import: String(body.import), draft }),
      done: ({ params, value }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'parts')}?revision=${(value as { revision: string }).revision}&saved=1`,
    },
  },
  ({ actor, workshop, body, now }) =>
    confirmImport({ actor, workshopId: workshop.id, importId: body.import, now }),
)
