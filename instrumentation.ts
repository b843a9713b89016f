import type { Instrumentation } from 'next'

/** A page that failed: one line with the id its reader was shown. */
export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return
  const { log } = await import('@/lib/config/log')
  const { digest } = error as { digest?: string }
  log().error({ error, digest, method: request.method, route: context.routePath }, 'page failed')
}
