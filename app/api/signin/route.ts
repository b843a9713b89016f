import { ASKED_COOKIE, cookieOf, setCookie } from '@/lib/auth/cookies'
import { LINK_SECONDS } from '@/lib/auth/options'
import { makeToken } from '@/lib/config/secrets'
import { SignInInput } from '@/lib/contracts/sign-in'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { requestSignInLink } from '@/lib/services/sign-in/request-sign-in-link'

export const POST = route(
  {
    deed: 'session:start',
    body: SignInInput,
    limit: 'sign_in',
    form: {
      name: 'signin',
      back: ({ draft }) => `${paths.signIn()}?draft=${draft}`,
      done: () => paths.signInSent,
    },
  },
  async ({ body, now, request, answer }) => {
    const askedBy = cookieOf(request, ASKED_COOKIE) ?? makeToken()
    const sent = await requestSignInLink({ email: body.email, next: body.next, askedBy, now })
    if (sent.ok) answer.append('set-cookie', setCookie(ASKED_COOKIE, askedBy, LINK_SECONDS))
    return sent
  },
)
