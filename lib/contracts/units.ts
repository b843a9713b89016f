import { z } from 'zod'
import { type OfferKind, offerKind, paragraphs } from './fields'

/** Finished units as the owner types them: a serial number a line, or lines of `serial;form`. */
export const RecordUnitsInput = z.object({
  offer: offerKind,
  serials: paragraphs(40_000, 1, 'Enter at least one serial number.'),
})
export type RecordUnitsInput = z.infer<typeof RecordUnitsInput>

/** A finished unit and what became of it. */
export type UnitRow = {
  unit: string
  serial: string
  offer: OfferKind
  state: 'started' | 'rework' | 'passed' | 'allocated' | 'posted' | 'returned' | 'scrapped'
  orderNumber: string | null
}
