import 'server-only'
import { createHmac } from 'node:crypto'
import { env } from '@/lib/config/env'

/**
 * The token of the link that changes or takes back a sign-up. It follows from the id, so that every later mail can
 * carry the same link while the table keeps its hash only.
 */
export function takeBackToken(signUpId: string): string {
  return createHmac('sha256', env().AUTH_SECRET).update(`take-back ${signUpId}`).digest('base64url')
}
