import type { Day } from '@/lib/core/brand'

/** The instant every world begins at: a Monday morning in Hamburg. */
export const NOW = new Date('2027-03-01T09:00:00Z')
export const TODAY: Day = '2027-03-01'

/** Instants as the tests write them. */
export const at = (text: string) => new Date(text)
export const hoursAfter = (instant: Date, hours: number) => new Date(instant.getTime() + hours * 3_600_000)

let made = 0
/** A number no other row of this file got, for slugs and addresses. */
export const serial = () => (made += 1)
