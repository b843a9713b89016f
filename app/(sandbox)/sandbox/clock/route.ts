import { SandboxClock } from '@/lib/contracts/sandbox'
import { sandboxRoute } from '@/lib/http/sandbox-route'
import { paths } from '@/lib/paths'
import { advanceClock } from '@/lib/services/sandbox/advance-clock'

export const POST = sandboxRoute(
  {
    body: SandboxClock,
    form: {
      name: 'sandbox-clock',
      back: ({ draft }) => `${paths.sandbox}?draft=${draft}`,
      done: () => paths.sandbox,
    },
  },
  ({ body }) => advanceClock({ hours: body.advanceHours }),
)
