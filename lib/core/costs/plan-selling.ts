import type { ProcessingFee } from '@/lib/core/money/provider'
import type { TaxMode } from '@/lib/core/orders/tax-rate'

/** One offer of the run: what a unit of it brings and what it takes besides parts. Money in the selling currency. */
export type PlanOffer = {
  /** 'boards', 'kit' or 'built'; quantities name it. */
  readonly offer: string
  /** Price of one unit as the page shows it (with or without tax: `tax.pricesIncludeTax`). */
  readonly price: number
  /** The part of it paid as a deposit. */
  readonly deposit: number
  /** Whether its boards are assembled before posting, by assembler or maker: then units are started to cover the yield. */
  readonly isAssembled: boolean
  /** Paid minutes for each unit sold: bagging, packing, papers. */
  readonly minutesPerUnit: number
  /** Paid minutes for each unit put into work: building, testing. 0 where nothing is assembled. */
  readonly minutesPerStart: number
  /** Box, bags, label, printed guide per unit: a decimal string of minor units. */
  readonly packaging: string
}

/** One question of an offer and how the run's units fall on its answers. */
export type PlanChoice = {
  readonly offer: string
  /** Weights are relative whole numbers: orders so far, or a guess. Units are split by `divide`. */
  readonly answers: readonly { readonly id: string; readonly weight: number; readonly surcharge: number }[]
}

/** How orders are put together. */
export type PlanOrders = {
  /** Average units of one order, a decimal string ≥ 1 such as '1.15'. Orders = units ÷ this, rounded up. */
  readonly unitsPerOrder: string
  /** 2 with a deposit and a balance, 1 when all is paid at once. */
  readonly paymentsPerOrder: 1 | 2
  /** Postage of one order: what buyers are charged, and what the post takes. Averages of the destinations. */
  readonly postageCharged: number
  readonly postagePaid: number
}

/** What the payment provider keeps. Shares in basis points of the money paid, or of the orders where said. */
export type PlanFees = {
  /** Every payment. */
  readonly home: ProcessingFee
  /** On top for cards from abroad: the extra rate, and the share of money paid with them. */
  readonly foreignCard: { readonly basisPoints: number; readonly shareBasisPoints: number }
  /** On top where the provider converts a currency: the extra rate, and the share of money it applies to. */
  readonly conversion: { readonly basisPoints: number; readonly shareBasisPoints: number }
  /** Orders paid in full and paid back, per orders that stay; `fixed` is what a refund costs besides. */
  readonly refund: { readonly shareBasisPoints: number; readonly fixed: number; readonly isFeeLost: boolean }
  /** Disputed orders, and what each costs in fees. */
  readonly dispute: { readonly shareBasisPoints: number; readonly fixed: number }
}

/** The sales tax in the run's prices. */
export type PlanTax = {
  /** Without tax in 'not_registered' and 'export_without_tax'. */
  readonly mode: TaxMode
  readonly pricesIncludeTax: boolean
  /**
   * Rates the units are sold at, with relative whole weights: one entry at the home rate, one per destination group at
   * destination rates, one of 0 for what leaves the tax area. Units are split by `divide`; postage bears the same rates.
   */
  readonly rates: readonly { readonly basisPoints: number; readonly weight: number }[]
}

/** When the provider's money reaches the bank; used for cash over time, not for the cost. */
export type PlanPayout = {
  readonly delayDays: number
  /** Share held back, and for how long. */
  readonly reserveBasisPoints: number
  readonly reserveDays: number
}
