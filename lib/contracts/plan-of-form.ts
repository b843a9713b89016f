import { emptyPlan, type CostPlan } from '@/lib/core/costs/plan'
import type { PlanPart } from '@/lib/core/costs/plan-buying'
import type { PlanChoice } from '@/lib/core/costs/plan-selling'
import type { TaxMode } from '@/lib/core/orders/tax-rate'
import type { PlanInput } from './plan-forms'
import { readUnitPrice } from '@/lib/core/plain/unit-price'

/** What a plan takes from elsewhere: the prices of the offers, the workshop's tax, the parts list. */
export type PlanSetting = {
  currency: string
  offers: readonly { kind: string; priceMinor: number | null; depositMinor: number | null }[]
  taxMode: TaxMode
  pricesIncludeTax: boolean
  payoutDelayDays: number
  parts: readonly PlanPart[]
  /** The questions the offers ask; those of an offer that is not sold are left out. */
  choices?: readonly PlanChoice[]
}

/** The short form as the cost plan the core computes with. An offer the form does not name takes no work and no packaging. */
export function planOfForm(form: PlanInput, setting: PlanSetting): CostPlan {
  const { currency } = setting
  const packagingOf = (typed: string | undefined) => {
    const price = readUnitPrice(typed?.trim() || '0', currency)
    return price.ok ? price.value : '0'
  }
  return {
    ...emptyPlan(currency),
    offers: setting.offers.map(({ kind, priceMinor, depositMinor }) => {
      const work = form.offers.find(({ offer }) => offer === kind)
      return {
        offer: kind,
        price: priceMinor ?? 0,
        deposit: depositMinor ?? 0,
        isAssembled: work?.isAssembled ?? false,
        minutesPerUnit: work?.minutesPerUnit ?? 0,
        minutesPerStart: work?.isAssembled ? work.minutesPerStart : 0,
        packaging: packagingOf(work?.packaging),
      }
    }),
    choices: (setting.choices ?? []).filter(({ offer }) => setting.offers.some(({ kind }) => kind === offer)),
    oneOff: form.oneOff,
    atRisk: form.atRisk,
    boards: form.boards.map(({ name, kind, perUnit, perArray, spare, neededFor, stencil, ...quote }, i) => ({
      id: `board-${i + 1}`,
      name,
      kind,
      perUnit,
      neededFor,
      perArray,
      onHand: 0,
      attrition: { basisPoints: 0, atLeast: spare },
      stencil,
      quotes: [quote],
    })),
    parts: setting.parts,
    assembly: form.assembly && { ...form.assembly, perJoint: '0', perHandJoint: '0' },
    suppliers: form.suppliers.map(({ supplier, currency: own, freight, duty, importTax, reclaimable }) => ({
      supplier,
      currency: own,
      freight,
      dutyBasisPoints: duty,
      importTaxBasisPoints: importTax,
      isImportTaxReclaimable: reclaimable,
    })),
    rates: form.rates.map(({ currency: own, rate, on, margin }) => ({
      currency: own,
      rate,
      on,
      marginBasisPoints: margin,
    })),
    labour: { perHour: form.labourPerHourMinor, onceMinutes: form.onceMinutes },
    yield: { basisPoints: form.yieldPercent, confidenceBasisPoints: form.confidencePercent },
    orders: {
      unitsPerOrder: form.unitsPerOrder,
      paymentsPerOrder: 2,
      postageCharged: form.postageChargedMinor,
      postagePaid: form.postagePaidMinor,
    },
    fees: {
      home: { basisPoints: form.fee, fixed: form.feeFixedMinor },
      foreignCard: { basisPoints: form.foreignFee, shareBasisPoints: form.foreignShare },
      conversion: { basisPoints: 0, shareBasisPoints: 0 },
      refund: { shareBasisPoints: form.refundShare, fixed: 0, isFeeLost: true },
      dispute: { shareBasisPoints: form.disputeShare, fixed: form.disputeFixedMinor },
    },
    tax: {
      mode: setting.taxMode,
      pricesIncludeTax: setting.pricesIncludeTax,
      rates: form.taxes.map(({ rate, weight }) => ({ basisPoints: rate, weight })),
    },
    payout: { delayDays: setting.payoutDelayDays, reserveBasisPoints: 0, reserveDays: 0 },
    outlook: {
      canLayOut: form.canLayOutMinor ?? null,
      laterUnits: form.laterUnits,
      failureBasisPoints: form.failurePercent,
    },
  }
}
