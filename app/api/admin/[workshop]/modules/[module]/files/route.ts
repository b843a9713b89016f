import { FileInput, MOST_FILE_BYTES } from '@/lib/contracts/files'
import { ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { addFile } from '@/lib/services/files/add-file'

export const POST = route(
  {
    deed: 'file:add',
    params: ModuleParams,
    body: FileInput,
    upload: MOST_FILE_BYTES,
    status: 201,
    form: {
      name: 'file',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'files')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'files')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body, files, now }) =>
    addFile({
      ...{ actor, workshopId: workshop.id, module: params.module, input: body, now },
      file: files.file ?? null,
    }),
)
