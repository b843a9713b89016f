import { SignUpInput } from '@/lib/contracts/signups'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { submitSignUp } from '@/lib/services/signups/submit-signup'

export const POST = route(
  {
    deed: 'signup:submit',
    body: SignUpInput,
    status: 202,
    form: {
      name: 'signup',
      back: ({ body, draft }) => paths.moduleDraft(String(body.workshop), String(body.module), draft),
      done: ({ body }) => paths.signUpSent(body.workshop, body.module),
    },
  },
  ({ body, now }) => submitSignUp({ input: body, now }),
)
