import type { Buy } from '@/lib/core/costs/purchase'

/** Who puts a part into place in one offer; a buyer's parts travel in the kit's bags. */
export type PlacedBy = 'assembler' | 'maker' | 'buyer'

/** A supplier's offer of one part: its price breaks and conditions, in its own currency. */
export type PlanQuote = Buy & {
  /** Names an entry of `CostPlan.suppliers`, or a supplier without freight and duty. */
  readonly supplier: string
  /** ISO 4217; prices and set-up are in its minor units. */
  readonly currency: string
}

/** One line of the parts list. */
export type PlanPart = {
  readonly id: string
  /** What the cost line is called; the id where it is left out. */
  readonly name?: string
  /** Whole pieces in each unit that needs it. */
  readonly perUnit: number
  /** The offers that need it. */
  readonly neededFor: readonly string[]
  /** Who places it, per offer; an offer left out counts as 'maker' where it is assembled; where nothing is, the buyer does. */
  readonly placedBy: Readonly<Record<string, PlacedBy>>
  /** Id of the choice's answer that needs it; left out: every unit of those offers does. */
  readonly choice?: string
  /** Whole pieces in stock. They are used first and cost this run nothing: they are paid for. */
  readonly onHand: number
  /** Loss at the placing: a share of the need in basis points, but at least so many pieces. Not applied to a need of 0. */
  readonly attrition: { readonly basisPoints: number; readonly atLeast: number }
  /** Solder joints per piece, for the assembler's price. */
  readonly joints: number
  /** Whether the assembler solders it by hand (through-hole) instead of by machine. */
  readonly byHand: boolean
  /** The cheapest in the selling currency, duty and lasting import tax included, is taken; ties to the earlier. */
  readonly quotes: readonly PlanQuote[]
}

/** A bare board or a front panel, bought in arrays of one or more. */
export type PlanBoard = {
  readonly id: string
  readonly name: string
  readonly kind: 'board' | 'front_panel'
  /** Whole pieces in each unit. */
  readonly perUnit: number
  readonly neededFor: readonly string[]
  /** As for parts: a front panel of one finish belongs to one answer. */
  readonly choice?: string
  /** Pieces per array the fab makes; 1 when they come singly. Quotes, moq and breaks count arrays. */
  readonly perArray: number
  readonly onHand: number
  /** Spare pieces ordered on top, before they are rounded up to arrays. */
  readonly attrition: { readonly basisPoints: number; readonly atLeast: number }
  /** A stencil, in the currency of the quote taken, once when the order is placed; 0 without one. Set-up is the quote's. */
  readonly stencil: number
  readonly quotes: readonly PlanQuote[]
}

/** What the assembler charges, in its own currency. Prices that may be fractions are decimal strings of minor units. */
export type PlanAssembly = {
  readonly supplier: string
  readonly currency: string
  /** Once per run. */
  readonly setup: number
  /** Once for each line of the parts list the assembler places (feeder loading). */
  readonly perDistinctPart: number
  /** Per joint soldered by machine, and by hand. */
  readonly perJoint: string
  readonly perHandJoint: string
  /** Per unit put into work, whatever is on it. */
  readonly perStart: string
}

/** What comes on top of everything bought from one supplier. */
export type PlanSupplier = {
  readonly supplier: string
  /** Of `freight`. */
  readonly currency: string
  /** One delivery; due as soon as anything is bought there. */
  readonly freight: number
  /** On goods and freight. */
  readonly dutyBasisPoints: number
  /** On goods, freight and duty. Counted as a cost only when it is not reclaimable. */
  readonly importTaxBasisPoints: number
  readonly isImportTaxReclaimable: boolean
}

/** How a purchase currency is turned into the selling currency. */
export type PlanRate = {
  readonly currency: string
  /** Major units of the selling currency for 1 major unit of this one, a decimal string such as '0.9234'. */
  readonly rate: string
  /** The day the rate was taken, 'YYYY-MM-DD'. Shown, never computed with. */
  readonly on: string
  /** Added to the rate: the currency may move before the invoice is paid, and the bank takes its share. */
  readonly marginBasisPoints: number
}
