import { z } from 'zod'
import { sandboxRoute } from '@/lib/http/sandbox-route'
import { readMails } from '@/lib/services/sandbox/read-mails'

export const GET = sandboxRoute({ query: z.object({ to: z.string().max(300).optional() }) }, ({ query }) =>
  readMails({ to: query.to }),
)
