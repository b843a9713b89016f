import { TokenInput } from '@/lib/contracts/signups'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { takeBackSignUp } from '@/lib/services/signups/take-back-signup'

export const POST = route(
  {
    deed: 'signup:take_back',
    body: TokenInput,
    form: {
      name: 'signup-take-back',
      back: ({ body, draft }) => `${paths.takeBack(String(body.token))}?draft=${draft}`,
      done: ({ body }) => `${paths.takeBack(body.token)}?done=1`,
    },
  },
  ({ body, now }) => takeBackSignUp({ token: body.token, now }),
)
