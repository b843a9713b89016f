import type { AddressInput } from '@/lib/contracts/address'

/** An address as the values of its form, by the dotted names of the fields. */
export function addressValues(address: AddressInput): Record<string, string> {
  const { lines, latin, ...rest } = address
  const pairs = [
    ...Object.entries(rest),
    ...lines.map((line, index) => [`lines.${index}`, line] as const),
    ...Object.entries(latin ?? {})
      .filter(([name]) => name !== 'lines')
      .map(([name, value]) => [`latin.${name}`, value] as const),
    ...(latin?.lines ?? []).map((line, index) => [`latin.lines.${index}`, line] as const),
  ]
  return Object.fromEntries(
    pairs.flatMap(([name, value]) => (typeof value === 'string' ? [[name, value]] : [])),
  )
}
