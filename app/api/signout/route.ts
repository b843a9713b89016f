import { cookieOf, SESSION_COOKIE, setCookie } from '@/lib/auth/cookies'
import { ok } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { endSession } from '@/lib/services/sign-in/end-session'

export const POST = route(
  {
    deed: 'session:end',
    form: { name: 'signout', back: () => paths.home, done: () => paths.home },
  },
  async ({ request, answer }) => {
    await endSession({ token: cookieOf(request, SESSION_COOKIE) ?? '' })
    answer.append('set-cookie', setCookie(SESSION_COOKIE, '', 0))
    return ok({ signedOut: true })
  },
)
