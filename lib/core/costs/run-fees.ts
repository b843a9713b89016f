import { timesFraction } from '@/lib/core/costs/decimal'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { CostLedger } from '@/lib/core/costs/run-line'
import type { Takings } from '@/lib/core/costs/run-revenue'
import { wholeFrom } from '@/lib/core/stats/argument'

/**
 * Prepares the payment provider's fees of a run: on the deposits and on the balances (each order pays the fixed sum twice),
 * what foreign cards and conversion add, what stays lost on orders paid back, and disputes.
 * Rounding: half-up once per line, on the sums of the run; the provider rounds each payment, a few minor units apart.
 */
export function paymentFees(plan: CostPlan, ledger: CostLedger): (run: number, taken: Takings) => void {
  const fees = feeRates(plan)
  const { refund, dispute } = plan.fees
  const refundedShare = shareOf('refund.shareBasisPoints', refund.shareBasisPoints)
  const disputedShare = shareOf('dispute.shareBasisPoints', dispute.shareBasisPoints)
  const disputeFee = wholeFrom(0, 'costRun: fees.dispute.fixed', dispute.fixed)
  return (run, { orders, paid, deposits }) => {
    const hasBalance = plan.orders.paymentsPerOrder === 2 && deposits > 0 && deposits < paid
    const first = fees.home(hasBalance ? deposits : paid) + (paid > 0 ? orders * fees.fixed : 0)
    const second = hasBalance ? fees.home(paid - deposits) + orders * fees.fixed : 0
    const foreign = fees.foreignCard(paid)
    const converted = fees.conversion(paid)
    ledger(run, 'payment_fee', hasBalance ? 'deposits' : 'payments', first)
    ledger(run, 'payment_fee', 'balances', second)
    ledger(run, 'payment_fee', 'foreign cards', foreign)
    ledger(run, 'payment_fee', 'conversion', converted)
    const kept = refund.isFeeLost ? first + second + foreign + converted : 0
    ledger(run, 'refund_fee', 'orders paid back', refundedShare(kept + orders * fees.refund))
    ledger(run, 'dispute_fee', 'disputed orders', disputedShare(orders * disputeFee))
  }
}

/** Prepares what taking deposits and paying them all back costs: fees the provider keeps, and its fee per refund. */
export function repaymentFees(plan: CostPlan): (orders: number, deposits: number) => number {
  const fees = feeRates(plan)
  return (orders, deposits) => {
    if (orders === 0 || deposits === 0) return 0
    const paid =
      fees.home(deposits) + orders * fees.fixed + fees.foreignCard(deposits) + fees.conversion(deposits)
    return (plan.fees.refund.isFeeLost ? paid : 0) + orders * fees.refund
  }
}

function feeRates({ fees: { home, foreignCard, conversion, refund } }: CostPlan) {
  return {
    home: shareOf('home.basisPoints', home.basisPoints),
    fixed: wholeFrom(0, 'costRun: fees.home.fixed', home.fixed),
    foreignCard: shareOfShare('foreignCard', foreignCard),
    conversion: shareOfShare('conversion', conversion),
    refund: wholeFrom(0, 'costRun: fees.refund.fixed', refund.fixed),
  }
}

function shareOf(name: string, basisPoints: number): (amount: number) => number {
  return timesFraction(BigInt(wholeFrom(0, `costRun: fees.${name}`, basisPoints)), 10_000n)
}

function shareOfShare(name: string, extra: CostPlan['fees']['foreignCard']): (amount: number) => number {
  const rate = BigInt(wholeFrom(0, `costRun: fees.${name}.basisPoints`, extra.basisPoints))
  const share = BigInt(wholeFrom(0, `costRun: fees.${name}.shareBasisPoints`, extra.shareBasisPoints))
  return timesFraction(rate * share, 100_000_000n)
}
