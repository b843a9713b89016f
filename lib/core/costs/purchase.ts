import { minor, type Minor } from '@/lib/core/brand'
import { readDecimal, timesFraction } from '@/lib/core/costs/decimal'
import { ok, refuse, type Result } from '@/lib/core/result'
import { wholeFrom } from '@/lib/core/stats/argument'

/** A price from a quantity on. The whole purchase is billed at it ("all-units" price). */
export type PriceBreak = {
  readonly from: number
  /** Decimal string of minor units: '0.4' is four tenths of a cent. */
  readonly unitPrice: string
}

/** How something is sold. */
export type Buy = {
  readonly breaks: readonly PriceBreak[]
  /** The supplier's minimum order, whole pieces; 0 or 1 for none. */
  readonly moq: number
  /** Only whole multiples are sold (tube, tray, reel); 1 for single pieces. */
  readonly multiple: number
  /** Charged once per purchase, minor units. */
  readonly setup: number
}

/** A purchase that covers a need: how many, at which unit price, what is paid in all, and what is left over. */
export type Purchase = {
  readonly quantity: number
  readonly unitPrice: string
  readonly cost: Minor
  readonly leftover: number
}

/**
 * The cheapest purchase that covers a need: it may be cheaper to buy up to the next price break and keep the rest.
 * Candidates are the need, the moq and every break, rounded up to the multiple; below the first break nothing is sold.
 * Units:    whole pieces; minor units of the quote's currency; unit prices decimal strings of minor units.
 * Domain:   needed, moq, setup whole ≥ 0, multiple and `from` whole ≥ 1, no two breaks alike → otherwise RangeError.
 * Refuses:  'not_sold' when there is no price at all. A need of 0 buys nothing and costs nothing.
 * Rounding: quantity × unit price exactly, then half-up once; set-up is added.
 * Accuracy: exact. Ties go to the larger quantity.
 * Cost:     linear in the number of breaks.
 * @example  cheapestPurchase({ needed: 90, breaks: [{ from: 1, unitPrice: '100' }, { from: 100, unitPrice: '80' }], moq: 1, multiple: 10, setup: 0 })  // → ok({ quantity: 100, unitPrice: '80', cost: 8000, leftover: 10 })
 * @example  cheapestPurchase({ needed: 1, breaks: [], moq: 1, multiple: 1, setup: 0 })  // → refuse('not_sold')
 */
export function cheapestPurchase({
  needed,
  ...buy
}: { readonly needed: number } & Buy): Result<Purchase, 'not_sold'> {
  wholeFrom(0, 'cheapestPurchase: needed', needed)
  const prices = priceSteps(buy)
  if (prices === null) return refuse('not_sold')
  const quantity = prices.quantityFor(needed)
  const [unitPrice, cost] = [prices.unitPriceOf(quantity), minor(prices.costOf(quantity))]
  return ok({ quantity, unitPrice, cost, leftover: quantity - needed })
}

/** One quote prepared for many needs: how many to buy, and what a quantity costs (set-up included). */
export type PriceSteps = {
  readonly quantityFor: (needed: number) => number
  /** The cost of that quantity. */
  readonly costFor: (needed: number) => number
  readonly costOf: (quantity: number) => number
  readonly unitPriceOf: (quantity: number) => string
}

/**
 * The rule of `cheapestPurchase` prepared for many needs of one quote; null when it is not sold.
 * Cost: breaks² once at worst, then a few steps per need.
 */
export function priceSteps({ breaks, moq, multiple, setup }: Buy): PriceSteps | null {
  wholeFrom(0, 'cheapestPurchase: moq', moq)
  wholeFrom(1, 'cheapestPurchase: multiple', multiple)
  wholeFrom(0, 'cheapestPurchase: setup', setup)
  const steps = [...breaks].sort((a, b) => a.from - b.from).map(priceStep)
  const first = steps[0]
  if (first === undefined) return null
  // Plain loops: a curve asks some hundred thousand times.
  const stepAt = (quantity: number) => {
    let i = steps.length - 1
    while (i > 0 && steps[i]!.from > quantity) i -= 1
    return i
  }
  const costOf = (quantity: number) =>
    quantity === 0 ? 0 : steps[stepAt(quantity)]!.costOf(quantity) + setup
  const later = cheapestFrom(
    steps.map(({ from }) => upTo(from, multiple)).map((quantity) => ({ quantity, cost: costOf(quantity) })),
  )
  const least = Math.max(moq, first.from)
  return {
    costOf,
    costFor: (needed) => {
      if (needed === 0) return 0
      const plain = upTo(needed > least ? needed : least, multiple)
      const at = stepAt(plain)
      const cost = steps[at]!.costOf(plain) + setup
      const better = later[at + 1]
      return better !== undefined && better.cost <= cost ? better.cost : cost
    },
    unitPriceOf: (quantity) => (quantity === 0 ? '0' : steps[stepAt(quantity)]!.unitPrice),
    quantityFor: (needed) => {
      if (needed === 0) return 0
      const plain = upTo(needed > least ? needed : least, multiple)
      const better = later[stepAt(plain) + 1]
      return better !== undefined && better.cost <= costOf(plain) ? better.quantity : plain
    },
  }
}

function priceStep({ from, unitPrice }: PriceBreak, i: number, all: readonly PriceBreak[]) {
  wholeFrom(1, 'cheapestPurchase: from', from)
  if (all[i - 1]?.from === from) throw new RangeError(`cheapestPurchase: from must differ, got ${from} twice`)
  const price = readDecimal('cheapestPurchase: unitPrice', unitPrice)
  return { from, unitPrice, costOf: timesFraction(price.digits, price.scale) }
}

type Candidate = { readonly quantity: number; readonly cost: number }

/** For each position the cheapest candidate from there on, ties to the larger. */
function cheapestFrom(candidates: readonly Candidate[]): readonly Candidate[] {
  const best = [...candidates]
  for (let i = best.length - 2; i >= 0; i--) {
    if (best[i + 1]!.cost <= best[i]!.cost) best[i] = best[i + 1]!
  }
  return best
}

function upTo(quantity: number, multiple: number): number {
  const rest = quantity % multiple
  return rest === 0 ? quantity : quantity - rest + multiple
}
