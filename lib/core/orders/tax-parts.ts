import { minor, type Minor } from '@/lib/core/brand'
import { allocate } from '@/lib/core/money/allocate'
import { roundHalfUp } from '@/lib/core/money/round'

/** What of a sum bears one rate of tax; `grossMinor` with the tax in it. */
export type TaxPart = { readonly basisPoints: number; readonly grossMinor: Minor; readonly taxMinor: Minor }

type Taxed = { readonly basisPoints: number; readonly grossMinor: number; readonly taxMinor: number }

/**
 * Lines added up by their rate of tax, the highest rate first.
 * Units:   minor units, basis points.
 * Domain:  amounts safe integers → otherwise RangeError.
 * @example taxParts([{ basisPoints: 1900, grossMinor: 119, taxMinor: 19 }, { basisPoints: 1900, grossMinor: 238, taxMinor: 38 }])  // → [{ basisPoints: 1900, grossMinor: 357, taxMinor: 57 }]
 */
export function taxParts(lines: readonly Taxed[]): TaxPart[] {
  const rates = [...new Set(lines.map(({ basisPoints }) => basisPoints))].sort((a, b) => b - a)
  return rates.map((basisPoints) => {
    const own = lines.filter((line) => line.basisPoints === basisPoints)
    return {
      basisPoints,
      grossMinor: minor(own.reduce((sum, { grossMinor }) => sum + grossMinor, 0)),
      taxMinor: minor(own.reduce((sum, { taxMinor }) => sum + taxMinor, 0)),
    }
  })
}

/**
 * How a payment divides over the rates of what it is for, and the tax in each part: in proportion to what of each rate is
 * left, so that the last payment takes exactly the rest and the parts always add up to the whole.
 * Units:    minor units.
 * Domain:   amount whole ≥ 0 → otherwise RangeError. What is paid beyond the whole is divided as the whole is.
 * Rounding: gross by largest remainder; tax half-up, the last part the exact rest.
 * Source:   own rule; Directive 2006/112/EC art. 65 taxes a payment on account on the amount received (from memory).
 * @example partsOfPayment({ whole: [{ basisPoints: 1900, grossMinor: minor(11900), taxMinor: minor(1900) }], before: [], amount: 2500 })  // → [{ basisPoints: 1900, grossMinor: 2500, taxMinor: 399 }]
 */
export function partsOfPayment(payment: {
  readonly whole: readonly TaxPart[]
  /** What of the whole earlier payments have taken. */
  readonly before: readonly TaxPart[]
  readonly amount: number
}): TaxPart[] {
  const { whole, before, amount } = payment
  if (!Number.isSafeInteger(amount) || amount < 0)
    throw new RangeError(`partsOfPayment: amount must be a whole number ≥ 0, got ${amount}`)
  const left = lessParts(whole, before)
  const isWithin = grossOf(left) >= amount && left.every(({ grossMinor }) => grossMinor >= 0)
  const base = isWithin ? left : whole
  const shares = allocate(
    amount,
    base.map(({ grossMinor }) => grossMinor),
  )
  if (!shares.ok) return []
  return base
    .map((part, i) => ({
      basisPoints: part.basisPoints,
      grossMinor: shares.value[i]!,
      taxMinor: taxOfShare(part, shares.value[i]!),
    }))
    .filter(({ grossMinor }) => grossMinor > 0)
}

const taxOfShare = (part: TaxPart, share: number): Minor =>
  minor(
    part.grossMinor === 0 ? 0 : roundHalfUp(BigInt(part.taxMinor) * BigInt(share), BigInt(part.grossMinor)),
  )

/**
 * Parts less other parts, rate by rate; a rate that only the others have comes out negative.
 * @example lessParts([{ basisPoints: 0, grossMinor: minor(5), taxMinor: minor(0) }], [{ basisPoints: 0, grossMinor: minor(2), taxMinor: minor(0) }])  // → [{ basisPoints: 0, grossMinor: 3, taxMinor: 0 }]
 */
export function lessParts(parts: readonly TaxPart[], others: readonly TaxPart[]): TaxPart[] {
  return taxParts([
    ...parts,
    ...others.map(({ basisPoints, grossMinor, taxMinor }) => ({
      basisPoints,
      grossMinor: -grossMinor,
      taxMinor: -taxMinor,
    })),
  ])
}

/**
 * All parts together, tax in.
 * @example grossOf([{ basisPoints: 0, grossMinor: minor(5), taxMinor: minor(0) }])  // → 5
 */
export function grossOf(parts: readonly TaxPart[]): Minor {
  return minor(parts.reduce((sum, { grossMinor }) => sum + grossMinor, 0))
}

/**
 * The tax of all parts together.
 * @example taxOf([{ basisPoints: 1900, grossMinor: minor(119), taxMinor: minor(19) }])  // → 19
 */
export function taxOf(parts: readonly TaxPart[]): Minor {
  return minor(parts.reduce((sum, { taxMinor }) => sum + taxMinor, 0))
}
