import { minor } from '@/lib/core/brand'
import { emptyPlan, type CostPlan } from '@/lib/core/costs/plan'
import {
  type Module,
  Part,
  Plan,
  Quote,
  QuoteBreak,
  type Revision,
  RevisionLine,
  type Run,
  type Workshop,
} from '@/models'
import { NOW, serial, TODAY } from './base'

type Design = { workshop: Workshop; module: Module; revision: Revision }

/**
 * Costs that can be done in the head: 300.00 once, 5.00 of packaging for each unit, nothing else; no tax, no fees. Kits
 * at 95.00 leave 90.00 each before parts.
 */
export const PLAN: CostPlan = {
  ...emptyPlan('EUR'),
  oneOff: [{ name: 'Tooling', amount: 30_000, currency: 'EUR' }],
  offers: (['boards', 'kit', 'built'] as const).map((offer) => ({
    offer,
    price: 1,
    deposit: 1,
    isAssembled: offer === 'built',
    minutesPerUnit: 0,
    minutesPerStart: 0,
    packaging: '500',
  })),
  yield: { basisPoints: 9500, confidenceBasisPoints: 9500 },
}

/** The module's own plan, or the run's where one is given, with one step of ten working days. */
export function makePlan({ workshop, module, run }: Design & { run?: Run }, over: Partial<CostPlan> = {}) {
  return Plan.create({
    workshopId: workshop.id,
    moduleId: module.id,
    runId: run?.id ?? null,
    plan: { ...PLAN, ...over } as unknown as Record<string, unknown>,
    steps: [{ id: 'build', name: 'Build', optimistic: 10, likely: 10, pessimistic: 10, after: [] }],
    createdAt: NOW,
    changedAt: NOW,
    changedByPersonId: workshop.createdByPersonId,
  })
}

/** A parts list of one resistor, two in each kit and built unit, quoted at a cent each with plenty in stock. */
export async function makePartsList({ workshop, revision }: Design, over: { quotedOn?: string } = {}) {
  const workshopId = workshop.id
  const part = await Part.create({
    workshopId,
    code: `R-${serial()}`,
    value: '100k',
    createdAt: NOW,
    sampleCheckedOn: null,
    sampleFits: null,
    sampleNote: null,
    sampleByPersonId: null,
  })
  const line = await RevisionLine.create({
    workshopId,
    revisionId: revision.id,
    partId: part.id,
    position: 0,
    designators: 'R1, R2',
    perUnit: 2,
    placedBy: { kit: 'buyer', built: 'assembler' },
    choiceAnswerId: null,
  })
  const quotedOn = over.quotedOn ?? TODAY
  const quote = await Quote.create({
    workshopId,
    partId: part.id,
    supplier: 'Quayside Parts',
    currency: 'EUR',
    leadDays: null,
    quotedOn,
    stockSeen: 50_000,
    stockSeenOn: quotedOn,
    setupMinor: minor(0),
  })
  await QuoteBreak.create({ workshopId, quoteId: quote.id, fromQuantity: 1, unitPrice: '1' })
  return { part, line, quote }
}

/** Everything the readiness list asks for but money at the provider, which only payments bring. */
export async function makeReady(design: Design) {
  await makePartsList(design)
  await makePlan(design)
}

/** The line that is short in every test: the provider has kept its fees of the deposits. */
export const FEES_WAIVED = [{ key: 'repay' as const, reason: 'I pay the fees in from my own bank.' }]
