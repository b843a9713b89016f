import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { connectPaymentAccount } from '@/lib/services/workshops/connect-payment-account'

export const POST = route(
  {
    deed: 'payment_account:connect',
    params: z.object({ workshop: slug }),
    form: {
      name: 'payment-account',
      back: ({ params, draft }) => `${paths.adminPaymentAccount(params.workshop)}?draft=${draft}`,
      done: ({ value }) => (value as { url: string }).url,
    },
  },
  ({ actor, workshop, now }) => connectPaymentAccount({ actor, workshopId: workshop.id, now }),
)
