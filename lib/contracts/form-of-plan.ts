import type { CostPlan } from '@/lib/core/costs/plan'
import { plainMoney } from '@/lib/core/money/plain'
import { writeShare } from '@/lib/core/plain/share'
import { writeUnitPrice } from '@/lib/core/plain/unit-price'
import { writeBreaks } from './price-breaks'

/** Two in a hundred come back. Our own value; common practice, no source. */
const USUAL_FAILURES = 200

type Step = {
  id: string
  name: string
  optimistic: number
  likely: number
  pessimistic: number
  after: readonly string[]
  offers?: readonly string[]
  closedFrom?: string | null
  closedTo?: string | null
}

/** A stored plan as the short form shows it (see `formValues`); what the form does not ask is left as the plan has it. */
export function formOfPlan(plan: CostPlan, steps: readonly Step[]) {
  const { currency } = plan
  return {
    currency,
    offers: plan.offers.map((offer) => ({
      offer: offer.offer,
      isAssembled: offer.isAssembled,
      minutesPerUnit: offer.minutesPerUnit,
      minutesPerStart: offer.minutesPerStart,
      packaging: writeUnitPrice(offer.packaging, currency),
    })),
    labourPerHourMinor: plan.labour.perHour,
    onceMinutes: plan.labour.onceMinutes,
    yieldPercent: writeShare(plan.yield.basisPoints),
    confidencePercent: writeShare(plan.yield.confidenceBasisPoints),
    unitsPerOrder: plan.orders.unitsPerOrder,
    postageChargedMinor: plan.orders.postageCharged,
    postagePaidMinor: plan.orders.postagePaid,
    fee: writeShare(plan.fees.home.basisPoints),
    feeFixedMinor: plan.fees.home.fixed,
    foreignFee: writeShare(plan.fees.foreignCard.basisPoints),
    foreignShare: writeShare(plan.fees.foreignCard.shareBasisPoints),
    refundShare: writeShare(plan.fees.refund.shareBasisPoints),
    disputeShare: writeShare(plan.fees.dispute.shareBasisPoints),
    disputeFixedMinor: plan.fees.dispute.fixed,
    canLayOutMinor: plan.outlook?.canLayOut ?? null,
    laterUnits: plan.outlook?.laterUnits ?? 0,
    failurePercent: writeShare(plan.outlook?.failureBasisPoints ?? USUAL_FAILURES),
    taxes: plan.tax.rates.map(({ basisPoints, weight }) => ({ rate: writeShare(basisPoints), weight })),
    oneOff: plan.oneOff.map(asTyped),
    atRisk: plan.atRisk.map(asTyped),
    boards: plan.boards.map((board) => {
      const quote = board.quotes[0]
      const own = quote?.currency ?? currency
      return {
        name: board.name,
        kind: board.kind,
        perUnit: board.perUnit,
        perArray: board.perArray,
        spare: board.attrition.atLeast,
        boards: board.neededFor.includes('boards'),
        kit: board.neededFor.includes('kit'),
        built: board.neededFor.includes('built'),
        supplier: quote?.supplier ?? '',
        currency: own,
        moq: quote?.moq ?? 1,
        multiple: quote?.multiple ?? 1,
        setup: plainMoney(quote?.setup ?? 0, own),
        stencil: plainMoney(board.stencil, own),
        breaks: writeBreaks(quote?.breaks ?? [], own),
      }
    }),
    assembly: plan.assembly && {
      supplier: plan.assembly.supplier,
      currency: plan.assembly.currency,
      setup: plainMoney(plan.assembly.setup, plan.assembly.currency),
      perDistinctPart: plainMoney(plan.assembly.perDistinctPart, plan.assembly.currency),
      perStart: writeUnitPrice(plan.assembly.perStart, plan.assembly.currency),
    },
    suppliers: plan.suppliers.map((each) => ({
      supplier: each.supplier,
      currency: each.currency,
      freight: plainMoney(each.freight, each.currency),
      duty: writeShare(each.dutyBasisPoints),
      importTax: writeShare(each.importTaxBasisPoints),
      reclaimable: each.isImportTaxReclaimable,
    })),
    rates: plan.rates.map(({ currency: own, rate, on, marginBasisPoints }) => ({
      currency: own,
      rate,
      on,
      margin: writeShare(marginBasisPoints),
    })),
    steps: steps.map(({ id: _id, after, offers = [], ...step }) => ({
      ...step,
      boards: offers.includes('boards'),
      kit: offers.includes('kit'),
      built: offers.includes('built'),
      after: after.map((id) => steps.findIndex((other) => other.id === id) + 1).join(', '),
    })),
  }
}

const asTyped = ({ name, amount, currency }: CostPlan['oneOff'][number]) => ({
  name,
  currency,
  amount: plainMoney(amount, currency),
})
