import { JoinInput } from '@/lib/contracts/settings'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { acceptMembership } from '@/lib/services/members/accept-membership'

/** Where each role works. */
const DESKS: Readonly<Record<string, (workshop: string) => string>> = {
  owner: paths.admin,
  bench: paths.bench,
  packer: paths.packing,
}

export const POST = route(
  {
    deed: 'membership:accept',
    body: JoinInput,
    form: {
      name: 'join',
      back: ({ body, draft }) => `${paths.join(String(body.token))}?draft=${draft}`,
      done: ({ value }) => {
        const { workshop, role } = value as { workshop: string; role: string }
        return (DESKS[role] ?? paths.admin)(workshop)
      },
    },
  },
  ({ actor, body, now }) => acceptMembership({ actor, token: body.token, now }),
)
