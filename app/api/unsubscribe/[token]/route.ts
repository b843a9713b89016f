import { UnsubscribeParams } from '@/lib/contracts/signups'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { unsubscribe } from '@/lib/services/mails/unsubscribe'

/** One click of a mail program (RFC 8058), or the button of the page. */
export const POST = route(
  {
    deed: 'mail:unsubscribe',
    params: UnsubscribeParams,
    form: {
      name: 'unsubscribe',
      back: ({ params }) => paths.unsubscribe(params.token),
      done: ({ params }) => `${paths.unsubscribe(params.token)}?done=1`,
    },
  },
  ({ params, now }) => unsubscribe({ token: params.token, now }),
)

/** A mail program without one click opens the address: it is led to the page that asks. Looking ends nothing. */
export const GET = route(
  { deed: 'mail:unsubscribe', params: UnsubscribeParams },
  async ({ params }) =>
    new Response(null, { status: 303, headers: { location: paths.unsubscribe(params.token) } }),
)
