import { ModuleParams } from '@/lib/contracts/module-forms'
import { ImportStart, MOST_IMPORT_BYTES } from '@/lib/contracts/part-import'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { startImport } from '@/lib/services/part-imports/start-import'

export const POST = route(
  {
    deed: 'part:import',
    params: ModuleParams,
    body: ImportStart,
    upload: MOST_IMPORT_BYTES,
    status: 201,
    form: {
      name: 'part-import',
      back: ({ params, body, draft }) =>
        paths.adminPartImport(params.workshop, params.module, {
          revision: String(body.revision),
          kind: String(body.kind),
          draft,
        }),
      done: ({ params, value }) =>
        paths.adminPartImport(params.workshop, params.module, value as { import: string }),
    },
  },
  ({ actor, workshop, params, body, files, now }) =>
    startImport({
      ...{ actor, workshopId: workshop.id, module: params.module, input: body, now },
      file: files.file ?? null,
    }),
)
