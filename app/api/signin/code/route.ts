import { ASKED_COOKIE, cookieOf, SESSION_COOKIE, setCookie } from '@/lib/auth/cookies'
import { SESSION_SECONDS } from '@/lib/auth/options'
import { SignInCodeInput } from '@/lib/contracts/sign-in'
import { ok } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { signInByCode } from '@/lib/services/sign-in/sign-in-by-code'

export const POST = route(
  {
    deed: 'session:start',
    body: SignInCodeInput,
    limit: 'code',
    form: {
      name: 'signin-code',
      back: ({ draft }) => `${paths.signInSent}?draft=${draft}`,
      done: ({ value }) => (value as { next: string }).next,
    },
  },
  async ({ body, request, answer }) => {
    const signedIn = await signInByCode({ askedBy: cookieOf(request, ASKED_COOKIE), code: body.code })
    if (!signedIn.ok) return signedIn
    answer.append('set-cookie', setCookie(SESSION_COOKIE, signedIn.value.token, SESSION_SECONDS))
    return ok({ next: signedIn.value.returnTo ?? paths.account })
  },
)
