import { timesFraction } from '@/lib/core/costs/decimal'
import { exchange } from '@/lib/core/costs/exchange'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { CostLedger, Unpriced } from '@/lib/core/costs/run-line'
import { wholeFrom } from '@/lib/core/stats/argument'

/** Goods bought in one run from each of the plan's suppliers, in the selling currency; −1 where nothing is bought. */
export type Goods = Float64Array

/**
 * Prepares freight, duty and import tax of everything bought in a run.
 * Rounding: half-up once per supplier and line; duty on goods and freight, import tax on these and duty.
 */
export function supplierCosts(
  plan: CostPlan,
  ledger: CostLedger,
  report: (found: Unpriced) => void,
): (run: number, goods: Goods) => void {
  const suppliers = plan.suppliers.map((supplier) => {
    const { freight, dutyBasisPoints, importTaxBasisPoints } = supplier
    for (const [field, value] of Object.entries({ freight, dutyBasisPoints, importTaxBasisPoints })) {
      wholeFrom(0, `costRun: ${supplier.supplier}.${field}`, value)
    }
    const convert = exchange(supplier.currency, plan.currency, plan.rates)
    const lasting = supplier.isImportTaxReclaimable ? 0 : importTaxBasisPoints
    return {
      name: supplier.supplier,
      freight: freight === 0 ? 0 : (convert?.(freight) ?? null),
      dutyOn: timesFraction(BigInt(dutyBasisPoints), 10_000n),
      taxOn: timesFraction(BigInt(lasting), 10_000n),
    }
  })
  return (run, goods) => {
    suppliers.forEach(({ name, freight: known, dutyOn, taxOn }, i) => {
      const bought = goods[i]!
      if (bought < 0) return
      if (known === null) report({ kind: 'freight', name, reason: 'no_rate' })
      const freight = known ?? 0
      const duty = dutyOn(bought + freight)
      ledger(run, 'freight', name, freight)
      ledger(run, 'duty', name, duty)
      ledger(run, 'import_tax', name, taxOn(bought + freight + duty))
    })
  }
}
