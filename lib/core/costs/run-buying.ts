import { withAttrition } from '@/lib/core/costs/attrition'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { PlanBoard, PlanPart, PlanQuote } from '@/lib/core/costs/plan-buying'
import { quoteChooser, type Chosen } from '@/lib/core/costs/quote-choice'
import type { Unpriced } from '@/lib/core/costs/run-line'
import type { Column, OfferColumns } from '@/lib/core/costs/run-split'
import { wholeFrom } from '@/lib/core/stats/argument'

/** One thing to buy, prepared for many quantities. */
export type Buying = {
  readonly id: string
  readonly name: string
  readonly kind: 'part' | 'board' | 'front_panel'
  /** In the currency of the quote taken. */
  readonly stencil: number
  /** Why nothing of it can be priced, if so. */
  readonly unpriced: Unpriced['reason'] | null
  /** Writes into `needs` the pieces each run needs, losses not counted. */
  readonly fillNeeds: (offers: readonly OfferColumns[], needs: Column) => void
  /** The need with attrition; stock not yet taken off. */
  readonly wanted: (needed: number) => number
  /** How many pieces, or arrays, must be bought once stock is used. */
  readonly missing: (wanted: number) => number
  /** The cheapest purchase of what is missing; null when no quote can be used. */
  readonly choose: ((missing: number) => Chosen) | null
}

type Use = 'starts' | 'units' | null

/** Prepares everything a plan buys, boards and front panels first. */
export function buyingsOf(plan: CostPlan): readonly Buying[] {
  return [
    ...plan.boards.map((board) => boardBuying(plan, board)),
    ...plan.parts.map((part) => partBuying(plan, part)),
  ]
}

function partBuying(plan: CostPlan, part: PlanPart): Buying {
  const uses = plan.offers.map(({ offer, isAssembled }): Use => {
    if (!part.neededFor.includes(offer)) return null
    return isAssembled && part.placedBy[offer] !== 'buyer' ? 'starts' : 'units'
  })
  return prepare(plan, { ...part, name: part.name ?? part.id, kind: 'part', perArray: 1, stencil: 0 }, uses)
}

function boardBuying(plan: CostPlan, board: PlanBoard): Buying {
  // A front panel goes on last, to units that passed; a board is used up with every unit put into work.
  const uses = plan.offers.map(({ offer, isAssembled }): Use => {
    if (!board.neededFor.includes(offer)) return null
    return isAssembled && board.kind === 'board' ? 'starts' : 'units'
  })
  return prepare(plan, board, uses)
}

type Item = {
  readonly id: string
  readonly name: string
  readonly kind: Buying['kind']
  readonly perUnit: number
  readonly perArray: number
  readonly choice?: string
  readonly onHand: number
  readonly attrition: PlanPart['attrition']
  readonly stencil: number
  readonly quotes: readonly PlanQuote[]
}

function prepare(plan: CostPlan, item: Item, uses: readonly Use[]): Buying {
  const { id, name, kind, perUnit, perArray, choice, onHand, attrition, stencil, quotes } = item
  for (const [field, value] of Object.entries({ perUnit, onHand, stencil }))
    wholeFrom(0, `costRun: ${id}.${field}`, value)
  wholeFrom(1, `costRun: ${id}.perArray`, perArray)
  withAttrition(0, attrition)
  const choose = quoteChooser(plan, quotes)
  const isQuoted = quotes.some(({ breaks }) => breaks.length > 0)
  return {
    ...{ id, name, kind, stencil, choose },
    unpriced: choose !== null ? null : isQuoted ? 'no_rate' : 'no_quote',
    fillNeeds: (offers, needs) => {
      needs.fill(0)
      uses.forEach((use, i) => {
        const column = use === null ? undefined : columnOf(offers[i]!, use, choice)
        if (column !== undefined) for (let k = 0; k < needs.length; k++) needs[k]! += column[k]! * perUnit
      })
    },
    wanted: (needed) => (needed === 0 ? 0 : withAttrition(needed, attrition)),
    missing: (wanted) => (wanted <= onHand ? 0 : Math.ceil((wanted - onHand) / perArray)),
  }
}

/** The units, or units put into work, of an offer that one answer (or every unit) calls for. */
export function columnOf(
  offer: OfferColumns,
  use: 'starts' | 'units',
  answer: string | undefined,
): Column | undefined {
  if (answer === undefined) return offer[use]
  return (use === 'starts' ? offer.startsByAnswer : offer.unitsByAnswer).get(answer)
}
