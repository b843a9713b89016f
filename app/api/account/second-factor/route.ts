import { cookieOf, SESSION_COOKIE } from '@/lib/auth/cookies'
import { SecondFactorInput } from '@/lib/contracts/sign-in'
import { problem } from '@/lib/http/errors'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { giveSecondFactor } from '@/lib/services/sign-in/give-second-factor'

export const POST = route(
  {
    deed: 'second_factor:give',
    body: SecondFactorInput,
    limit: 'code',
    form: {
      name: 'second-factor',
      back: ({ body, draft }) => `${paths.secondFactor(String(body.next ?? paths.account))}&draft=${draft}`,
      done: ({ body }) => body.next ?? paths.account,
    },
  },
  async ({ actor, body, now, request }) => {
    if (actor.kind !== 'person') return problem('not_signed_in')
    const sessionToken = cookieOf(request, SESSION_COOKIE) ?? ''
    return giveSecondFactor({ actor, sessionToken, code: body.code, now })
  },
)
