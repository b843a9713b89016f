import type { InvoiceView } from './papers'
import type { OrderView } from './orders'

/** A repayment as the buyer sees it. */
export type RefundView = {
  id: string
  amountMinor: number
  currency: string
  cause: string
  reason: string | null
  /** waiting: asked for, or short of money · on_its_way · arrived · failed. */
  state: 'waiting' | 'on_its_way' | 'arrived' | 'failed'
  requestedAt: string
  settledAt: string | null
}

/** Everything the order's own page tells beside what the API lists. */
export type OrderPageView = OrderView & {
  timeZone: string
  /** Country of the workshop: parcels within it carry no country line. */
  homeCountry: string
  country: string
  runState: 'taking_deposits' | 'locked' | 'closed' | 'called_off' | 'draft'
  runReason: string | null
  minimum: number
  decideBy: string
  balanceWhen: 'at_lock' | 'units_passed' | 'before_packing'
  lapseOn: string | null
  /** Whose order it is. */
  personId: string
  /** Withdrawing after the lock; `endsOn` null while the last piece has not arrived. */
  withdrawal: { hasRight: boolean; endsOn: string | null }
  /** Where goods withdrawn from are sent back to. */
  returnTo: string[]
  /** Why the owner entered it; null for orders placed here. Only its workshop sees it. */
  manualReason: string | null
  /** What is still to be paid before a change of the order holds; 0 without one. */
  changeToPayMinor: number
  isDisputed: boolean
  cancelCause: string | null
  cancelReason: string | null
  choices: { line: string; question: string; answer: string }[]
  /** none: nothing begun · open: a card page is open · bank_asks: the bank wants the buyer · unknown: nobody knows yet. */
  payment: 'none' | 'open' | 'bank_asks' | 'unknown'
  refunds: RefundView[]
  invoices: InvoiceView[]
  terms: { number: number; body: string } | null
}
