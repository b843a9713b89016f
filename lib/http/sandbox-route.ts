import { env } from '@/lib/config/env'
import { problem } from './errors'
import { route } from './route'

/** A call of the sandbox: a route like any other while the fakes are on, and nothing at all otherwise. */
export const sandboxRoute: typeof route = (spec, run) => {
  const handler = route(spec, run)
  return async (request, segment) => (env().SANDBOX ? handler(request, segment) : problem('not_found'))
}
