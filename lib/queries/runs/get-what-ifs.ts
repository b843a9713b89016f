import 'server-only'
import type { WhatIfDesk, WhatIfFigures } from '@/lib/contracts/what-ifs'
import type { CostPlan } from '@/lib/core/costs/plan'
import { can, type Actor } from '@/lib/core/policy/can'
import { Plan, Run } from '@/models'
import { costFiguresOf } from './cost-figures-of'
import { planOfRun } from './costs-of'
import { getRunFacts } from './get-run-facts'
import type { RunFacts } from './run-facts'

/** Plans side by side, the run's own among them. */
export const MOST_SIDE_BY_SIDE = 4

/**
 * A run's plan and its what-ifs side by side; null when the actor may not see them, or there is no such run. A fixed number
 * of statements.
 */
export async function getWhatIfs(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  now: Date
}): Promise<WhatIfDesk | null> {
  const { actor, workshopId, runId, now } = cmd
  if (!can(actor, 'cost:read', { workshopId })) return null
  const run = await Run.findOne({ where: { id: runId, workshopId }, include: ['module', 'workshop'] })
  const facts = run && (await getRunFacts({ workshopId, runId, now }))
  if (!run?.module || !run.workshop || !facts) return null
  const rows = await Plan.findAll({ where: { runId, isBase: false }, order: [['createdAt', 'ASC']] })
  const own = planOfRun(facts)
  const { locale } = run.workshop
  const base = own ? figuresOfPlan(facts, { id: null, name: '', units: null }, locale) : null
  const others = rows.map((row) =>
    figuresOfPlan(withPlan(facts, row.plan as unknown as CostPlan), row, locale),
  )
  const plans = [base, ...others].filter((each) => each !== null)
  return {
    run: { id: run.id, number: run.number, currency: run.currency, maximum: run.maximum },
    module: { slug: run.module.slug, name: run.module.name },
    locale,
    offers: facts.offers.map(({ kind, priceMinor }) => ({ offer: kind, priceMinor })),
    suppliers: own ? suppliersOf(own) : [],
    plans: base ? plans : [],
    canAdd: base !== null && rows.length < MOST_SIDE_BY_SIDE - 1,
  }
}

/** The facts of a run as they would be under another plan, at that plan's prices. */
function withPlan(facts: RunFacts, costs: CostPlan): RunFacts {
  const priceOf = new Map(costs.offers.map(({ offer, price }) => [offer, price]))
  return {
    ...facts,
    offers: facts.offers.map((offer) => ({
      ...offer,
      priceMinor: priceOf.get(offer.kind) ?? offer.priceMinor,
    })),
    plan: facts.plan && { ...facts.plan, costs },
  }
}

function figuresOfPlan(
  facts: RunFacts,
  { id, name, units }: { id: string | null; name: string; units: number | null },
  locale: string,
): WhatIfFigures | null {
  const figures = costFiguresOf(facts, { units: units ?? undefined, locale })
  if (!figures) return null
  return {
    id,
    name,
    units: figures.units,
    prices: facts.offers.map(({ kind, priceMinor }) => ({ offer: kind, priceMinor })),
    yieldBasisPoints: figures.build.yieldBasisPoints,
    breakEven: figures.breakEven.safeFrom,
    profit: figures.totals.profit,
    costPerUnit: figures.perUnit.cost,
    profitPerUnit: figures.perUnit.profit,
    starts: figures.build.starts,
    cashLow: figures.cash.low,
    expectedProfit: figures.expectedProfit,
    chanceOfLoss: figures.chanceOfLoss,
    unpriced: figures.unpriced.length,
  }
}

const suppliersOf = ({ parts, boards, assembly }: CostPlan): string[] =>
  [
    ...new Set([
      ...[...parts, ...boards].flatMap(({ quotes }) => quotes.map(({ supplier }) => supplier)),
      ...(assembly ? [assembly.supplier] : []),
    ]),
  ].sort()
