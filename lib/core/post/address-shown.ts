const DAY_MS = 86_400_000

/** Days after its arrival for which a packer still sees where a parcel went. Own rule (product: privacy of packing). */
const SHOWN_DAYS = 30

/**
 * Whether the address of a parcel may still stand on a packer's screen or paper: until thirty days after it arrived, and
 * always before that.
 * Units:    instants; null while it has not arrived.
 * Rounding: none; the thirtieth day counts in full.
 * Source:   own rule: whoever packs needs an address to post a parcel and to follow it, and no longer.
 * @example isAddressShown({ deliveredAt: null, now: new Date('2027-03-01T09:00:00Z') })  // → true
 * @example isAddressShown({ deliveredAt: new Date('2027-01-01T09:00:00Z'), now: new Date('2027-02-01T09:00:00Z') })  // → false
 */
export function isAddressShown({
  deliveredAt,
  now,
}: {
  readonly deliveredAt: Date | null
  readonly now: Date
}): boolean {
  return deliveredAt === null || now.getTime() - deliveredAt.getTime() <= SHOWN_DAYS * DAY_MS
}
