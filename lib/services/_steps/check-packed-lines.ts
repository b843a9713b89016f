import type { PackInput } from '@/lib/contracts/packing'
import { packingMistakes as words } from '@/lib/messages/packing'

/** A line of the parcel as it stands, and how it is called. */
export type ExpectedLine = { line: string; quantity: number; name: string }

/**
 * What is wrong with the lines a packer ticked, by field: every line of the parcel exactly once, all of it, and nothing
 * else; null when nothing is. Serial numbers are only counted here.
 */
export function checkPackedLines(
  expected: readonly ExpectedLine[],
  given: PackInput['lines'],
): Record<string, string> | null {
  const errors: Record<string, string> = {}
  const seen = new Set<string>()
  for (const [i, { line, quantity, serials }] of given.entries()) {
    const own = expected.find((each) => each.line === line)
    if (!own) errors[`lines.${i}.line`] = words.foreignLine
    else if (seen.has(line)) errors[`lines.${i}.line`] = words.lineTwice
    else if (quantity !== own.quantity) errors[`lines.${i}.quantity`] = words.quantityIs(own.quantity)
    else if (serials && serials.length > 0 && serials.length !== quantity)
      errors[`lines.${i}.serials`] = words.serialCount(quantity)
    seen.add(line)
  }
  const missing = expected.filter(({ line }) => !seen.has(line))
  if (missing.length > 0) errors.lines = words.lineMissing(missing.map(({ name }) => name))
  return Object.keys(errors).length > 0 ? errors : null
}
