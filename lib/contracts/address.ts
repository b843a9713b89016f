import { z } from 'zod'
import { countryCode, line, optionalLine } from './fields'

const latin = z.object({
  name: line(100, 'Enter the name in Latin letters.'),
  organization: optionalLine(100),
  lines: z.array(line(120)).min(1, 'Enter the street in Latin letters.').max(3),
  city: optionalLine(100),
  region: optionalLine(100),
})

/**
 * Where a parcel goes, in the buyer's own script, with the same in Latin letters where the post needs both.
 * The shape is lib/core/post/address.ts's `Address`; what a destination requires is `addressProblems`'s matter.
 */
export const AddressInput = z.object({
  country: countryCode,
  name: line(100, 'Enter the name on the parcel.'),
  organization: optionalLine(100),
  lines: z.preprocess(
    (typed) => (Array.isArray(typed) ? typed.filter((each) => each !== '') : (typed ?? [])),
    z
      .array(line(120), { error: 'Enter the street and number.' })
      .max(3)
      // At the first line, where it is mended.
      .superRefine((lines, check) => {
        if (lines.length === 0)
          check.addIssue({ code: 'custom', path: [0], message: 'Enter the street and number.' })
      }),
  ),
  city: optionalLine(100),
  region: optionalLine(100),
  postcode: optionalLine(20),
  phone: optionalLine(30),
  taxNumber: optionalLine(40),
  latin: z.preprocess((typed) => {
    if (typeof typed !== 'object' || typed === null) return undefined
    const fields = typed as Record<string, unknown>
    const lines = Array.isArray(fields.lines) ? fields.lines.filter((each) => each !== '') : []
    return fields.name || lines.length > 0 ? { ...fields, lines } : undefined
  }, latin.optional()),
})
export type AddressInput = z.infer<typeof AddressInput>
