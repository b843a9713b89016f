import type { IncomingMessage, ServerResponse } from 'node:http'
import { env } from '@/lib/config/env'
import { BARE_POLICY, contentPolicy } from '@/lib/http/content-policy.mjs'

const ALWAYS = {
  'X-Content-Type-Options': 'nosniff',
  'X-Frame-Options': 'DENY',
  'Referrer-Policy': 'strict-origin-when-cross-origin',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
  'Permissions-Policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=()',
} as const

/** Kept pages leave for as long as nothing changes; a copy further away would not hear of a change. */
const KEPT_ELSEWHERE = /^s-maxage=/

/** Set before anything answers, so that no route can be without; settled when the answer leaves. */
export function setSecurityHeaders(request: IncomingMessage, response: ServerResponse): void {
  for (const [name, value] of Object.entries(ALWAYS)) response.setHeader(name, value)
  if (env().IS_HTTPS) response.setHeader('Strict-Transport-Security', 'max-age=63072000; includeSubDomains')
  // A link from a mail carries a token in its address: it must not leave us (but `no-referrer` would blank Origin too).
  if (/^\/(confirm|take-back|unsubscribe|invitation|signin)\b/.test(request.url ?? '')) {
    response.setHeader('Referrer-Policy', 'same-origin')
  }
  const writeHead = response.writeHead.bind(response) as (...parts: unknown[]) => ServerResponse
  response.writeHead = ((...parts: unknown[]) => {
    settle(response)
    return writeHead(...parts)
  }) as ServerResponse['writeHead']
}

/** A page that is kept brings its own policy after the proxy's; the last one is made from the page itself. */
function settle(response: ServerResponse): void {
  const policies = [response.getHeader('content-security-policy') ?? policyWithoutPage(response)].flat()
  response.setHeader('Content-Security-Policy', String(policies.at(-1)))
  if (KEPT_ELSEWHERE.test(String(response.getHeader('cache-control') ?? ''))) {
    response.setHeader('Cache-Control', 'public, max-age=0, must-revalidate')
  }
}

/** While developing no page is kept, so those the proxy leaves alone have no policy of their own. */
function policyWithoutPage(response: ServerResponse): string {
  const isPage = String(response.getHeader('content-type') ?? '').startsWith('text/html')
  if (env().NODE_ENV !== 'development' || !isPage) return BARE_POLICY
  return contentPolicy({ scripts: ["'unsafe-inline'"], cardPageUrl: env().CARD_PAGE_URL, isDev: true })
}
