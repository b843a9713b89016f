/** What a cost line is for; the order in which a run's lines are listed. */
export type LineKind =
  | 'one_off'
  | 'board'
  | 'front_panel'
  | 'part'
  | 'stencil'
  | 'assembly'
  | 'freight'
  | 'duty'
  | 'import_tax'
  | 'labour'
  | 'packaging'
  | 'per_unit'
  | 'postage'
  | 'payment_fee'
  | 'refund_fee'
  | 'dispute_fee'

/** Takes one cost of the k-th run of a series, in minor units of the selling currency. */
export type CostLedger = (run: number, kind: LineKind, name: string, amount: number) => void

/** Why a cost is not in the sum: nothing is quoted, or the currency has no rate. */
export type Unpriced = {
  readonly kind: 'part' | 'board' | 'front_panel' | 'assembly' | 'one_off' | 'freight'
  readonly name: string
  readonly reason: 'no_quote' | 'no_rate'
}
