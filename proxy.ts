import { type NextRequest, NextResponse } from 'next/server'
import { env } from '@/lib/config/env'
import { contentPolicy } from '@/lib/http/content-policy.mjs'

/**
 * Gives every page made per request a nonce of its own. The framework reads it from the request's policy and puts
 * it on the scripts it writes. Public pages never come this way: they are kept, with hashes (cache-handler.mjs).
 */
export function proxy(request: NextRequest) {
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString('base64')
  const { CARD_PAGE_URL: cardPageUrl, NODE_ENV, IS_HTTPS: isHttps } = env()
  const isDev = NODE_ENV === 'development'
  const policy = contentPolicy({ scripts: [`'nonce-${nonce}'`], cardPageUrl, isDev, isHttps })
  const headers = new Headers(request.headers)
  headers.set('content-security-policy', policy)
  const response = NextResponse.next({ request: { headers } })
  response.headers.set('content-security-policy', policy)
  return response
}

export const config = {
  matcher: [
    // Everything but what is kept or no page: a page forgotten here would be served without its scripts.
    '/((?!_next/|api/|w/|terms$|privacy$|accessibility$|favicon\\.ico$|robots\\.txt$|sitemap\\.xml$).+)',
    '/w/:workshop/:module/form/:draft',
  ],
}
