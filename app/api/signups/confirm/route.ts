import { TokenInput } from '@/lib/contracts/signups'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { confirmSignUp } from '@/lib/services/signups/confirm-signup'

export const POST = route(
  {
    deed: 'signup:confirm',
    body: TokenInput,
    form: {
      name: 'signup-confirm',
      back: ({ body, draft }) => `${paths.confirm(String(body.token))}?draft=${draft}`,
      done: ({ body }) => `${paths.confirm(body.token)}?done=1`,
    },
  },
  ({ body, now }) => confirmSignUp({ token: body.token, now }),
)
