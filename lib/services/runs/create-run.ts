import 'server-only'
import type { Transaction } from 'sequelize'
import { refuseFields, type FieldRefusal } from '@/lib/contracts/problem'
import type { RunInput } from '@/lib/contracts/runs'
import { minor } from '@/lib/core/brand'
import { toProvider } from '@/lib/core/money/provider'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { addDays } from '@/lib/core/time/day'
import { dayIn, startOfDay } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { runWords } from '@/lib/messages/runs'
import { copyBasePlan } from '@/lib/services/_steps/copy-base-plan'
import { recordMove } from '@/lib/services/_steps/record-move'
import { Module, Offer, Revision, Run, RunOffer, Workshop } from '@/models'

type Design = { module: Module; revision: Revision; offers: Offer[] }

/**
 * Drafts a run of a module's revision, with the prices it will sell at and its own copy of the module's plan. Nothing is
 * shown to anybody and nothing can be ordered before it is opened.
 * Refuses: forbidden · not_found · invalid (unknown module, revision or offer; a sum the provider cannot charge; a
 * decide-by day that is not ahead). Locks: the module. Writes: run, offers, plan, audit. Repeat: makes another draft.
 */
export function createRun(cmd: { actor: Actor; workshopId: string; input: RunInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx): Promise<Result<{ run: string }, string> | FieldRefusal> => {
    if (actor.kind !== 'person' || !can(actor, 'run:create', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx })
    if (!workshop) return refuse('not_found')
    if (input.decideBy <= dayIn(now, workshop.timeZone))
      return refuseFields({ decideBy: runWords.decideByAhead })
    const unchargeable = amountsRefused(input, workshop.currency)
    if (unchargeable) return refuseFields(unchargeable)
    const design = await findDesign(tx, workshopId, input)
    if (!design.ok) return design
    const run = await writeRun(tx, { workshop, design: design.value, input, personId: actor.personId, now })
    await recordMove(tx, {
      workshopId,
      subjectType: 'run',
      subjectId: run.id,
      from: null,
      event: 'create',
      to: run.state,
      byPersonId: actor.personId,
      at: now,
    })
    await copyBasePlan(tx, { run, byPersonId: actor.personId, now })
    return ok({ run: run.id })
  })
}

function amountsRefused(input: RunInput, currency: string): Record<string, string> | null {
  const wrong = input.offers.flatMap(({ priceMinor, depositMinor }, index) => [
    ...(toProvider(priceMinor, currency).ok
      ? []
      : [[`offers.${index}.priceMinor`, runWords.notChargeable] as const]),
    ...(toProvider(depositMinor, currency).ok
      ? []
      : [[`offers.${index}.depositMinor`, runWords.notChargeable] as const]),
  ])
  return wrong.length > 0 ? Object.fromEntries(wrong) : null
}

/** The module's row is locked, so that two drafts do not get the same number. */
async function findDesign(
  tx: Transaction,
  workshopId: string,
  input: RunInput,
): Promise<{ ok: true; value: Design } | FieldRefusal> {
  const module = await Module.findOne({
    where: { workshopId, slug: input.module },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  if (!module || module.state === 'archived') return refuseFields({ module: runWords.moduleUnknown })
  const revision = await Revision.findOne({
    where: { moduleId: module.id, letter: input.revision },
    transaction: tx,
  })
  if (!revision || revision.state === 'superseded')
    return refuseFields({ revision: runWords.revisionUnknown })
  const all = await Offer.findAll({ where: { moduleId: module.id, withdrawnAt: null }, transaction: tx })
  const offers = input.offers.flatMap(({ offer }) => all.filter(({ kind }) => kind === offer))
  const unknown = input.offers.findIndex(({ offer }) => !all.some(({ kind }) => kind === offer))
  if (unknown >= 0) return refuseFields({ [`offers.${unknown}.offer`]: runWords.offerUnknown })
  return ok({ module, revision, offers })
}

type Draft = { workshop: Workshop; design: Design; input: RunInput; personId: string; now: Date }

async function writeRun(tx: Transaction, { workshop, design, input, personId, now }: Draft): Promise<Run> {
  const { module, revision, offers } = design
  const last = await Run.max<number | null, Run>('number', {
    where: { moduleId: module.id },
    transaction: tx,
  })
  const run = await Run.create(
    {
      workshopId: workshop.id,
      moduleId: module.id,
      revisionId: revision.id,
      number: (last ?? 0) + 1,
      minimum: input.minimum,
      minimumFirst: input.minimum,
      maximum: input.maximum,
      limitPerPerson: workshop.limitPerPerson,
      currency: workshop.currency,
      decideByOn: input.decideBy,
      decideByAt: startOfDay(addDays(input.decideBy, 1), workshop.timeZone),
      decideByFirstOn: input.decideBy,
      headStartHours: input.headStartHours ?? workshop.headStartHours,
      balanceWhen: input.balanceWhen,
      holdingPlan: input.holdingPlan ?? null,
      createdAt: now,
      createdByPersonId: personId,
    },
    { transaction: tx },
  )
  await RunOffer.bulkCreate(
    input.offers.map(({ priceMinor, depositMinor, postedBy }, index) => ({
      workshopId: workshop.id,
      runId: run.id,
      offerId: offers[index]!.id,
      kind: offers[index]!.kind,
      priceMinor: minor(priceMinor),
      depositMinor: minor(depositMinor),
      taxClass: offers[index]!.taxClass,
      postedByOn: postedBy,
      postedByFirstOn: postedBy,
    })),
    { transaction: tx },
  )
  return run
}
