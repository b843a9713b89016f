import 'server-only'
import { createHash, createHmac, timingSafeEqual } from 'node:crypto'
import { env } from '@/lib/config/env'
import { ok, refuse, type Result } from '@/lib/core/result'

const SEAL_BYTES = 16
const idBytes = (mailId: string) => Buffer.from(mailId.replaceAll('-', ''), 'hex')
const sealOf = (id: Buffer) =>
  createHmac('sha256', env().AUTH_SECRET).update('unsubscribe').update(id).digest().subarray(0, SEAL_BYTES)

/** The token of a mail's unsubscribe links: its id and a seal only this deployment can make; nothing is stored. */
export function unsubscribeToken(mailId: string): string {
  const id = idBytes(mailId)
  return Buffer.concat([id, sealOf(id)]).toString('base64url')
}

/**
 * The mail a token was made for.
 * Refuses: 'unknown_link' when it was not made here.
 */
export function mailOfUnsubscribeToken(token: string): Result<string, 'unknown_link'> {
  const bytes = Buffer.from(token, 'base64url')
  if (bytes.length !== 16 + SEAL_BYTES) return refuse('unknown_link')
  const id = bytes.subarray(0, 16)
  if (!timingSafeEqual(sealOf(id), bytes.subarray(16))) return refuse('unknown_link')
  const hex = id.toString('hex')
  return ok(
    [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-'),
  )
}

/** Under what an address is remembered after it is gone: SHA-256 of the normalised address, hex. */
export const emailHash = (emailNormal: string) => createHash('sha256').update(emailNormal).digest('hex')
