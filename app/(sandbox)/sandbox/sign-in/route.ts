import { SESSION_COOKIE, setCookie } from '@/lib/auth/cookies'
import { SandboxSignIn } from '@/lib/contracts/sandbox'
import { ok } from '@/lib/core/result'
import { sandboxRoute } from '@/lib/http/sandbox-route'
import { paths } from '@/lib/paths'
import { signInAs } from '@/lib/services/sandbox/sign-in-as'

export const POST = sandboxRoute(
  {
    body: SandboxSignIn,
    form: {
      name: 'sandbox-sign-in',
      back: ({ draft }) => `${paths.sandbox}?draft=${draft}`,
      done: () => paths.account,
    },
  },
  async ({ body, now, answer }) => {
    const signedIn = await signInAs({ email: body.email, now })
    if (!signedIn.ok) return signedIn
    const { token, email, seconds } = signedIn.value
    answer.append('set-cookie', setCookie(SESSION_COOKIE, token, seconds))
    return ok({ email })
  },
)
