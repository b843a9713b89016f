import 'server-only'
import type { CostPlan } from '@/lib/core/costs/plan'
import { startsForUncertainYield, startsForYield } from '@/lib/core/size/starts'
import type { OfferKind } from '@/models/words'
import type { RunFacts } from './run-facts'

/** How many boards the plan's yield weighs against boards really built. Our own value; common practice, no source. */
const PLAN_COUNTS_AS = 20

/**
 * Assembled boards to put into work for what is ordered now: by the plan's yield, or once boards of this module have been
 * built, by what became of them with the plan as a first opinion.
 */
export function startsOf(
  plan: CostPlan,
  toBuild: { [K in OfferKind]?: number },
  built: RunFacts['built'],
): number {
  const need = plan.offers
    .filter(({ isAssembled }) => isAssembled)
    .reduce((sum, { offer }) => sum + (toBuild[offer as OfferKind] ?? 0), 0)
  const share = plan.yield.basisPoints / 10_000
  const confidence = plan.yield.confidenceBasisPoints / 10_000
  if (built.passed + built.scrapped === 0) return startsForYield({ need, yield: share, confidence })
  const prior = {
    alpha: Math.max(0.5, share * PLAN_COUNTS_AS),
    beta: Math.max(0.5, (1 - share) * PLAN_COUNTS_AS),
  }
  return startsForUncertainYield({ need, passed: built.passed, failed: built.scrapped, prior, confidence })
}
