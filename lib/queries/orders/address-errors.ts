import type { AddressInput } from '@/lib/contracts/address'
import { orderMistakes } from '@/lib/contracts/order-mistakes'
import { addressProblems } from '@/lib/core/post/address-problems'

/** A sentence at each field of an address that must be mended before it is taken; questions are not among them. */
export function addressErrors(address: AddressInput): Record<string, string> {
  const wrong = addressProblems(address).filter(({ severity }) => severity === 'error')
  return Object.fromEntries(
    wrong.map(({ field }) => [
      field === 'lines' ? 'address.lines.0' : `address.${field}`,
      orderMistakes.needed[field] ?? orderMistakes.country,
    ]),
  )
}
