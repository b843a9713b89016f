import 'server-only'
import { createHash, createHmac, randomBytes } from 'node:crypto'
import { env } from '@/lib/config/env'

/** A fresh secret for a link or a cookie: 32 random bytes as 43 characters of base64url. */
export const makeToken = (): string => randomBytes(32).toString('base64url')

/** What the database keeps of a secret. The form is next-auth's own for mailed links: SHA-256 of token and secret, hex. */
export const hashToken = (token: string): string =>
  createHash('sha256').update(`${token}${env().AUTH_SECRET}`).digest('hex')

/**
 * The short code shown for a link opened in another browser: six digits that follow from the token, so that nothing
 * more needs to be stored than their hash.
 */
export function codeFor(token: string): string {
  const digest = createHmac('sha256', env().AUTH_SECRET).update(`code ${token}`).digest()
  return String(digest.readUInt32BE(0) % 1_000_000).padStart(6, '0')
}
