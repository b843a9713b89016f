import { z } from 'zod'
import { uuid } from '@/lib/contracts/fields'
import { refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { openFile } from '@/lib/services/files/open-file'

/** Never run as a page of ours, whatever is in it: the browser shows or saves it, and nothing more. */
const GUARDED = {
  'x-content-type-options': 'nosniff',
  'content-security-policy': "default-src 'none'; sandbox",
}

export const GET = route({ params: z.object({ file: uuid }) }, async ({ actor, params }) => {
  const file = await openFile({ actor, file: params.file })
  if (!file) return refuse('not_found')
  const name = encodeURIComponent(file.fileName)
  return new Response(new Uint8Array(file.content), {
    headers: {
      ...GUARDED,
      'content-type': file.mediaType,
      'content-length': String(file.content.length),
      'content-disposition': `inline; filename*=UTF-8''${name}`,
      'cache-control': file.isPublic ? 'public, max-age=3600' : 'private, no-store',
    },
  })
})
