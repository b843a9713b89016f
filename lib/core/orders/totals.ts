import { minor, type Minor } from '@/lib/core/brand'
import { taxInGross, taxOnNet } from '@/lib/core/money/tax'

/** One line of an order as it is priced; amounts per piece, as shown on the page. */
export type PricedLine = {
  readonly quantity: number
  readonly priceMinor: number
  /** Surcharges of the choices, per piece. */
  readonly surchargeMinor: number
  readonly depositMinor: number
  readonly basisPoints: number
}

/** What an order costs, and when: the deposit now, the balance later; all in the order's currency. */
export type OrderTotals = {
  readonly lines: readonly {
    readonly totalMinor: Minor
    readonly taxMinor: Minor
    readonly depositMinor: Minor
  }[]
  readonly postageMinor: Minor
  readonly postageTaxMinor: Minor
  readonly taxMinor: Minor
  /** Everything, tax and postage included. */
  readonly totalMinor: Minor
  readonly depositMinor: Minor
  readonly balanceMinor: Minor
}

/**
 * Adds up an order. Where prices include tax everybody pays the same price, and the tax of the destination is the part
 * of it that is handed on; where they do not, tax is added to each line. Postage bears the rate given for it.
 * Units:    minor units, whole pieces, basis points.
 * Domain:   quantities whole ≥ 1, amounts whole ≥ 0, deposit ≤ price + surcharge → otherwise RangeError.
 * Rounding: tax half-up once per line (`taxInGross`, `taxOnNet`); everything else is exact.
 * @example orderTotals({ lines: [{ quantity: 2, priceMinor: 9500, surchargeMinor: 0, depositMinor: 2500, basisPoints: 1900 }], postageMinor: 1000, postageBasisPoints: 1900, pricesIncludeTax: true }).balanceMinor  // → 15000
 */
export function orderTotals(order: {
  lines: readonly PricedLine[]
  postageMinor: number
  postageBasisPoints: number
  pricesIncludeTax: boolean
}): OrderTotals {
  const taxed = (amount: number, basisPoints: number) => {
    const tax = order.pricesIncludeTax ? taxInGross(amount, basisPoints) : taxOnNet(amount, basisPoints)
    return { tax, gross: minor(order.pricesIncludeTax ? amount : amount + tax) }
  }
  const lines = order.lines.map((line) => {
    assertLine(line)
    const { tax, gross } = taxed(line.quantity * (line.priceMinor + line.surchargeMinor), line.basisPoints)
    return { totalMinor: gross, taxMinor: tax, depositMinor: minor(line.quantity * line.depositMinor) }
  })
  assertAmount('postageMinor', order.postageMinor)
  const postage = taxed(order.postageMinor, order.postageBasisPoints)
  const total = lines.reduce((sum, line) => sum + line.totalMinor, postage.gross as number)
  const deposit = lines.reduce((sum, line) => sum + line.depositMinor, 0)
  return {
    lines,
    postageMinor: postage.gross,
    postageTaxMinor: postage.tax,
    taxMinor: minor(lines.reduce((sum, line) => sum + line.taxMinor, postage.tax as number)),
    totalMinor: minor(total),
    depositMinor: minor(deposit),
    balanceMinor: minor(total - deposit),
  }
}

function assertAmount(name: string, amount: number): void {
  if (!Number.isSafeInteger(amount) || amount < 0)
    throw new RangeError(`orderTotals: ${name} must be a whole number ≥ 0, got ${amount}`)
}

function assertLine(line: PricedLine): void {
  if (!Number.isSafeInteger(line.quantity) || line.quantity < 1)
    throw new RangeError(`orderTotals: quantity must be a whole number ≥ 1, got ${line.quantity}`)
  assertAmount('priceMinor', line.priceMinor)
  assertAmount('surchargeMinor', line.surchargeMinor)
  assertAmount('depositMinor', line.depositMinor)
  if (line.depositMinor > line.priceMinor + line.surchargeMinor)
    throw new RangeError(`orderTotals: depositMinor must not be above the price, got ${line.depositMinor}`)
}
