import { FileRemoval } from '@/lib/contracts/files'
import { ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { removeFile } from '@/lib/services/files/remove-file'

export const POST = route(
  {
    deed: 'file:remove',
    params: ModuleParams,
    body: FileRemoval,
    form: {
      name: 'module-deed',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'files')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'files')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    removeFile({ actor, workshopId: workshop.id, module: params.module, file: body.file, now }),
)
