import { minor, type Minor } from '@/lib/core/brand'
import { exponentOf } from '@/lib/core/money/currency'
import { crossesCustoms, type PostPlace } from '@/lib/core/post/customs-territory'
import { wholeFrom } from '@/lib/core/stats/argument'

/** The heaviest item the letter post takes, grams (Universal Postal Union: small packet up to 2 kg). */
const LETTER_GRAMS = 2000

/**
 * Which customs form goes on a parcel: none within one customs and tax area, CN 22 on goods in the letter post up to the
 * limit, CN 23 above it, over two kilograms, and on every parcel.
 * Units:    value in minor units of `currency`; sdrRate: major units of `currency` for 1 SDR, a decimal string; limitSdr: whole
 *           or decimal SDR, inclusive; grams.
 * Domain:   value whole ≥ 0, an ISO 4217 currency, sdrRate > 0, grams ≥ 0, limitSdr ≥ 0 → otherwise RangeError.
 * Accuracy: compared exactly, without floats.
 * Source:   UPU Convention Regulations (300 SDR; the exact edge differs between posts, so it is an argument). Islands and
 *           special zones: customs-territory.ts.
 * @example  customsForm({ from: { country: 'DE' }, to: { country: 'GB' }, value: 30000, currency: 'EUR', sdrRate: '1.2', grams: 400, service: 'letter' })  // → 'CN22'
 * @example  customsForm({ from: { country: 'DE' }, to: { country: 'FR' }, value: 30000, currency: 'EUR', sdrRate: '1.2', grams: 400, service: 'parcel' })  // → 'none'
 */
export function customsForm({
  from,
  to,
  value,
  currency,
  sdrRate,
  grams,
  service,
  limitSdr = 300,
}: {
  readonly from: PostPlace
  readonly to: PostPlace
  readonly value: number
  readonly currency: string
  readonly sdrRate: string
  readonly grams: number
  readonly service: 'letter' | 'parcel'
  readonly limitSdr?: number
}): 'none' | 'CN22' | 'CN23' {
  wholeFrom(0, 'customsForm: value', value)
  if (!Number.isFinite(grams) || grams < 0)
    throw new RangeError(`customsForm: grams must be ≥ 0, got ${grams}`)
  const [rate, limit] = [fraction('sdrRate', sdrRate), fraction('limitSdr', String(limitSdr))]
  if (rate.top === 0n) throw new RangeError(`customsForm: sdrRate must be > 0, got ${sdrRate}`)
  const minorPerMajor = 10n ** BigInt(exponentOf(currency))
  if (!crossesCustoms(from, to)) return 'none'
  if (service === 'parcel' || grams > LETTER_GRAMS) return 'CN23'
  const isWithin = BigInt(value) * rate.bottom * limit.bottom <= rate.top * limit.top * minorPerMajor
  return isWithin ? 'CN22' : 'CN23'
}

function fraction(name: string, text: string): { top: bigint; bottom: bigint } {
  const match = /^([0-9]+)(?:\.([0-9]+))?$/.exec(text)
  if (match === null)
    throw new RangeError(`customsForm: ${name} must be a decimal such as '1.2', got ${text}`)
  const [, whole = '', part = ''] = match
  return { top: BigInt(whole + part), bottom: 10n ** BigInt(part.length) }
}

/** One line of an order as customs see it: the form in which a module is sold, not what is in its bags. */
export type CustomsItem = {
  /** What the thing is, in English or the destination's language: 'Kit for an audio signal module'. */
  readonly description: string
  readonly quantity: number
  /** True value of one piece, minor units: what the buyer pays for it, or would. Never 0, not for a replacement either. */
  readonly unitValue: number
  /** Net weight of one piece. */
  readonly unitGrams: number
  /** Customs tariff code, six digits or more; chosen per offer. A kit has one, that of what it makes. */
  readonly code: string
  /** ISO 3166-1 alpha-2 of the country it was made in. */
  readonly origin: string
}

/** One line of a customs form: all pieces of one kind together. */
export type CustomsLine = {
  readonly description: string
  readonly quantity: number
  readonly value: Minor
  readonly grams: number
  readonly code: string
  readonly origin: string
}

/**
 * The lines of the customs form for what is in a parcel: one per kind of thing, so that a kit is one line.
 * Things of one description, code, origin and unit value are counted together, in the order they first appear.
 * Units:    minor units of the order's currency, grams.
 * Domain:   quantities whole ≥ 1, values and grams whole ≥ 0 → otherwise RangeError.
 * @example  customsLines({ items: [{ description: 'Audio module kit', quantity: 2, unitValue: 9500, unitGrams: 310, code: '920790', origin: 'DE' }] })  // → [{ description: 'Audio module kit', quantity: 2, value: 19000, grams: 620, code: '920790', origin: 'DE' }]
 */
export function customsLines(order: { readonly items: readonly CustomsItem[] }): CustomsLine[] {
  const lines = new Map<string, CustomsLine>()
  for (const { description, quantity, unitValue, unitGrams, code, origin } of order.items) {
    wholeFrom(1, 'customsLines: quantity', quantity)
    wholeFrom(0, 'customsLines: unitValue', unitValue)
    wholeFrom(0, 'customsLines: unitGrams', unitGrams)
    const kind = JSON.stringify([description, unitValue, code, origin])
    const before = lines.get(kind)
    lines.set(kind, {
      description,
      quantity: quantity + (before?.quantity ?? 0),
      value: minor(quantity * unitValue + (before?.value ?? 0)),
      grams: quantity * unitGrams + (before?.grams ?? 0),
      code,
      origin,
    })
  }
  return [...lines.values()]
}

export {
  declarationProblems,
  type Declaration,
  type DeclarationProblem,
} from '@/lib/core/post/declaration-problems'
