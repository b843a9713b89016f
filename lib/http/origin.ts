import { env } from '@/lib/config/env'

/**
 * Whether a change may come from where it comes from: never with a foreign `Origin`; with a session cookie only
 * from our own pages (`Sec-Fetch-Site`, or an `Origin` equal to the base URL).
 */
export function isOwnOrigin(request: Request, hasSession: boolean): boolean {
  const origin = request.headers.get('origin')
  const site = request.headers.get('sec-fetch-site')
  const own = new URL(env().BASE_URL).origin
  if (origin !== null && origin !== own) return false
  if (!hasSession) return true
  return origin === own || site === 'same-origin' || site === 'none'
}
