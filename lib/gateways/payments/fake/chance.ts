import 'server-only'
import { createHash } from 'node:crypto'
import { env } from '@/lib/config/env'

const ALPHABET = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz'

function digest(label: string, n: number): Buffer {
  return createHash('sha256').update(`${env().SANDBOX_SEED}:${label}:${n}`).digest()
}

/** The n-th draw for a label under SANDBOX_SEED, 0 ≤ draw < 1; the same seed gives the same draws. */
export function chance(label: string, n: number): number {
  return digest(label, n).readUIntBE(0, 6) / 2 ** 48
}

/** The n-th id: looks like the provider's, the same under the same seed. */
export function idFor(prefix: string, n: number): string {
  return prefix + Array.from(digest(prefix, n).subarray(0, 24), (byte) => ALPHABET[byte % 62]).join('')
}

/** True when SANDBOX_FAULTS is on and the draw falls below `share`. */
export function isFault(label: string, n: number, share: number): boolean {
  return env().SANDBOX_FAULTS === 'all' && chance(label, n) < share
}
