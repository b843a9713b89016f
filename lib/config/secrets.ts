import 'server-only'
import { createCipheriv, createDecipheriv, createHash, createHmac, randomBytes } from 'node:crypto'
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

const sealKey = () => createHash('sha256').update(`seal ${env().AUTH_SECRET}`).digest()

/** Encrypts a short secret under the application's own (AES-256-GCM), for a column. */
export function seal(text: string): string {
  const iv = randomBytes(12)
  const cipher = createCipheriv('aes-256-gcm', sealKey(), iv)
  const sealed = Buffer.concat([cipher.update(text, 'utf8'), cipher.final()])
  return Buffer.concat([iv, cipher.getAuthTag(), sealed]).toString('base64url')
}

/** The other way round. Throws for what was not sealed under this secret. */
export function unseal(sealed: string): string {
  const bytes = Buffer.from(sealed, 'base64url')
  const decipher = createDecipheriv('aes-256-gcm', sealKey(), bytes.subarray(0, 12))
  decipher.setAuthTag(bytes.subarray(12, 28))
  return Buffer.concat([decipher.update(bytes.subarray(28)), decipher.final()]).toString('utf8')
}

const RECOVERY_CODES = 8

/**
 * Recovery codes that follow from a second-factor secret: they can be shown beside it until a first code proves that
 * it was copied, and nothing but their hashes is ever stored.
 */
export function recoveryCodesOf(secret: string): string[] {
  const codeAt = (_: unknown, index: number) =>
    createHmac('sha256', env().AUTH_SECRET).update(`recovery ${index} ${secret}`).digest('hex').slice(0, 10)
  return Array.from({ length: RECOVERY_CODES }, codeAt)
}
