import { z } from 'zod'
import { paragraphs, tick } from './fields'

/** A carrier's list as pasted; applied only once it was looked at. */
export const TrackingInput = z.object({
  csv: paragraphs(200_000, 1, 'Paste the list of the carrier.'),
  confirmed: tick.optional(),
})
export type TrackingInput = z.infer<typeof TrackingInput>

/** What became of a parcel on its way. */
const reported = z.enum(['delivered', 'lost', 'returned', 'found'], {
  error: 'Choose delivered, lost, returned or found.',
})
export type Reported = z.infer<typeof reported>

export const ReportInput = z.object({ state: reported })
export type ReportInput = z.infer<typeof ReportInput>

/** A line of the pasted list, and what it would do or why not. */
export type TrackingRow = {
  line: number
  order: string
  tracking: string | null
  /** s10: verified; other: cannot be verified. */
  kind: 's10' | 'other' | null
  state: 'delivered' | 'lost' | 'returned' | null
  parcel: string | null
  /** Why it is left out; null when it is taken. */
  mistake: string | null
}

/** Columns of the list for a carrier's own upload, in the order in which they can stand. */
export const POST_COLUMNS = [
  'order',
  'parcel',
  'name',
  'organization',
  'line1',
  'line2',
  'line3',
  'city',
  'region',
  'postcode',
  'country',
  'phone',
  'taxNumber',
  'service',
  'grams',
  'lengthMm',
  'widthMm',
  'heightMm',
  'contents',
  'code',
  'origin',
  'value',
  'currency',
  'form',
] as const
export type PostColumn = (typeof POST_COLUMNS)[number]

/** Which columns are wanted; all of them unless said. */
export const PostQuery = z.object({
  batch: z.preprocess((typed) => (typed === '' ? undefined : typed), z.uuid('Unknown.').optional()),
  columns: z.preprocess(
    (typed) =>
      typeof typed === 'string' && typed !== '' ? typed.split(',').map((name) => name.trim()) : undefined,
    z.array(z.enum(POST_COLUMNS, { error: 'Choose columns from the list.' })).optional(),
  ),
})
export type PostQuery = z.infer<typeof PostQuery>
