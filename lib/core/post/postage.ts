import { minor, type Minor } from '@/lib/core/brand'
import { ok, refuse, type Result } from '@/lib/core/result'

/** One service of the post in a zone, as its price list states it. */
export type PostService = {
  readonly id: string
  /** Heaviest parcel taken, whole grams, inclusive. */
  readonly maxGrams: number
  /** Longest side taken, whole millimetres, inclusive. */
  readonly maxMm: number
  /** Prices by weight: a parcel of at most `upTo` grams (inclusive) costs `price` minor units. */
  readonly bands: readonly { readonly upTo: number; readonly price: number }[]
}

/** Countries that cost the same. A zone whose countries are ['*'] is for every country no other zone names. */
export type Zone = {
  readonly id: string
  readonly countries: readonly string[]
  readonly services: readonly PostService[]
}

/** What a parcel costs and by which service it goes; zone and service are ids. */
export type Quote = { readonly zone: string; readonly service: string; readonly price: Minor }

/**
 * The cheapest service that takes a parcel of this weight and size to this country.
 * Units:    grams; sizeMm = [length, width, height]; prices in minor units of the workshop's currency.
 * Domain:   grams and sizes finite ≥ 0, prices safe integers ≥ 0 → otherwise RangeError.
 * Refuses:  'no_zone' when no zone takes the country; 'too_heavy' when no service there takes the weight;
 *           'too_large' when those that take the weight do not take the longest side.
 * Rounding: none; weight and side limits are inclusive. Ties go to the earlier service.
 * @example  postage([{ id: 'eu', countries: ['FR'], services: [{ id: 'small', maxGrams: 2000, maxMm: 600, bands: [{ upTo: 500, price: 700 }] }] }], 'FR', 500, [200, 120, 60])  // → ok({ zone: 'eu', service: 'small', price: 700 })
 * @example  postage([], 'FR', 500, [200, 120, 60])  // → refuse('no_zone')
 */
export function postage(
  zones: readonly Zone[],
  country: string,
  grams: number,
  sizeMm: readonly [number, number, number],
): Result<Quote, 'no_zone' | 'too_heavy' | 'too_large'> {
  assertMeasure('postage', 'grams', grams)
  sizeMm.forEach((mm, i) => assertMeasure('postage', `sizeMm[${i}]`, mm))
  const offers = zonesOf(zones, country).flatMap((zone) =>
    zone.services.map((service) => ({ zone, service, price: priceFor(service, grams) })),
  )
  if (offers.length === 0 && zonesOf(zones, country).length === 0) return refuse('no_zone')
  const bearing = offers.filter((offer) => offer.price !== undefined)
  if (bearing.length === 0) return refuse('too_heavy')
  const longest = Math.max(...sizeMm)
  const fitting = bearing.filter((offer) => longest <= offer.service.maxMm)
  const [first, ...others] = fitting
  if (first === undefined) return refuse('too_large')
  const best = others.reduce((cheapest, offer) => (offer.price! < cheapest.price! ? offer : cheapest), first)
  return ok({ zone: best.zone.id, service: best.service.id, price: minor(best.price!) })
}

function zonesOf(zones: readonly Zone[], country: string): readonly Zone[] {
  const named = zones.filter((zone) => zone.countries.includes(country))
  return named.length > 0 ? named : zones.filter((zone) => zone.countries.includes('*'))
}

/** The price of the lightest band that still holds the weight; none when the service does not take it. */
function priceFor(service: PostService, grams: number): number | undefined {
  if (grams > service.maxGrams) return undefined
  const holding = service.bands.filter((band) => grams <= band.upTo)
  const [first, ...others] = holding
  const band = others.reduce((light, other) => (other.upTo < light!.upTo ? other : light), first)
  if (band !== undefined && (!Number.isSafeInteger(band.price) || band.price < 0)) {
    throw new RangeError(`postage: price must be whole minor units ≥ 0, got ${band.price}`)
  }
  return band?.price
}

/**
 * The weight by which a carrier bills a large light parcel.
 * Units:    millimetres in, cm3PerKg as the carrier states it (6000 or 5000), grams out.
 * Domain:   sides finite ≥ 0, cm3PerKg > 0 → otherwise RangeError.
 * Rounding: up to a whole gram.
 * Source:   common practice: length × width × height in cm³ over the divisor, in kg.
 * @example  volumetricGrams({ lengthMm: 1400, widthMm: 1000, heightMm: 900 }, 6000)  // → 210000
 */
export function volumetricGrams(
  {
    lengthMm,
    widthMm,
    heightMm,
  }: { readonly lengthMm: number; readonly widthMm: number; readonly heightMm: number },
  cm3PerKg: number,
): number {
  for (const [name, mm] of Object.entries({ lengthMm, widthMm, heightMm })) {
    assertMeasure('volumetricGrams', name, mm)
  }
  if (!(cm3PerKg > 0) || !Number.isFinite(cm3PerKg)) {
    throw new RangeError(`volumetricGrams: cm3PerKg must be > 0, got ${cm3PerKg}`)
  }
  // mm³ ÷ 1000 is cm³, ÷ (cm³ per kg) is kg, × 1000 is g: the thousands cancel and whole numbers stay whole.
  return Math.ceil((lengthMm * widthMm * heightMm) / cm3PerKg)
}

function assertMeasure(called: string, name: string, value: number): void {
  if (!Number.isFinite(value) || value < 0) {
    throw new RangeError(`${called}: ${name} must be a finite number ≥ 0, got ${value}`)
  }
}
