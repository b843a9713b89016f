import 'server-only'
import { createHash } from 'node:crypto'
import type { AddressInput } from '@/lib/contracts/address'

/**
 * SHA-256 of a place, hex: the same for the same place written alike, whoever it is addressed to. Case, spaces and marks
 * between words do not count.
 */
export function addressFingerprint(address: AddressInput): string {
  const { country, lines, city, region, postcode } = address
  const words = [country, ...lines, city, region, postcode]
    .map((part) =>
      (part ?? '')
        .normalize('NFKC')
        .toLowerCase()
        .replaceAll(/[\s.,;-]+/g, ''),
    )
    .filter(Boolean)
  return createHash('sha256').update(JSON.stringify(words)).digest('hex')
}
