import 'server-only'
import type { Transaction } from 'sequelize'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { mayOpen } from '@/lib/core/states/run-guards'
import { next, RUN_MOVES } from '@/lib/core/states/run'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { pageChanged } from '@/lib/db/page-changed'
import { payments } from '@/lib/gateways/payments'
import { paths } from '@/lib/paths'
import { copyBasePlan } from '@/lib/services/_steps/copy-base-plan'
import { moveRun } from '@/lib/services/_steps/move-run'
import { recordDecision } from '@/lib/services/_steps/record-decision'
import { setDigestDue } from '@/lib/services/_steps/set-digest-due'
import { setRunDues } from '@/lib/services/_steps/set-run-dues'
import { startBulk } from '@/lib/services/_steps/start-bulk'
import { Module, Run, RunOffer, SignUp, TermsVersion, Workshop } from '@/models'

type Cmd = { actor: Actor; workshopId: string; runId: string; now: Date }
type Opening = { run: Run; workshop: Workshop; offers: RunOffer[]; terms: TermsVersion | null }

/**
 * Opens a run for deposits. Payouts of the account are made manual at the provider first, so that deposits stay where they
 * can be paid back from; then the run opens under the terms as they stand, and a bulk job invites every confirmed sign-up.
 * Refuses: not_found · forbidden · workshop_not_open · another_run_open · provider_unreachable · not_allowed · every reason
 * of `mayOpen`. Locks: the module, the run. Writes: run, plan if it had none, decision, bulk job, due rows, audit; public
 * pages are made anew. Repeat: refused as not_allowed.
 */
export async function openRun(cmd: Cmd) {
  const { actor, workshopId, runId, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'run:open_deposits', { workshopId })) return refuse('forbidden')
  const first = await inTransaction(async (tx) => {
    const opening = await readOpening(tx, cmd)
    return opening.ok ? ok(opening.value.workshop.providerAccountId) : opening
  })
  if (!first.ok) return first
  if (first.value === null) return refuse('account_cannot_charge')
  // Each change of the schedule has a key of its own: it may have been changed back since.
  const key = `payouts-manual:run:${runId}:${now.getTime()}`
  const manual = await payments().setManualPayouts({ account: first.value, key })
  if (!manual.ok) return refuse('provider_unreachable')
  return inTransaction(async (tx) => {
    const opening = await readOpening(tx, cmd)
    return opening.ok ? open(tx, opening.value, actor.personId, now) : opening
  })
}

/** Everything the guards ask for, judged; the module and the run are locked. */
async function readOpening(
  tx: Transaction,
  { workshopId, runId, now }: Cmd,
): Promise<Result<Opening, string>> {
  const seen = await Run.findOne({ where: { id: runId, workshopId }, transaction: tx })
  if (!seen) return refuse('not_found')
  const how = { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true } as const
  const module = await Module.findByPk(seen.moduleId, how)
  const run = await Run.findByPk(runId, how)
  const workshop = await Workshop.findByPk(workshopId, { transaction: tx, rejectOnEmpty: true })
  if (!next(RUN_MOVES, run.state, 'open_deposits').ok) return refuse('not_allowed')
  if (workshop.state !== 'open') return refuse('workshop_not_open')
  const others = await Run.count({
    where: { moduleId: module.id, state: 'taking_deposits' },
    transaction: tx,
  })
  if (others > 0) return refuse('another_run_open')
  const offers = await RunOffer.findAll({ where: { runId }, transaction: tx })
  const terms = await TermsVersion.findOne({
    where: { workshopId },
    order: [['number', 'DESC']],
    transaction: tx,
  })
  const may = mayOpen({
    minimum: run.minimum,
    maximum: run.maximum,
    today: dayIn(now, workshop.timeZone),
    decideBy: run.decideByOn,
    currency: run.currency,
    offers: offers.map(({ priceMinor, depositMinor, postedByOn }) => ({
      priceMinor,
      depositMinor,
      postedBy: postedByOn,
    })),
    accountCanCharge: workshop.chargesEnabledAt !== null,
    pagePublished: module.state === 'published',
    termsSet: terms !== null,
    holdingLimitDays: workshop.holdingLimitDays,
    statedPlan: run.holdingPlan,
  })
  return may.ok ? ok({ run, workshop, offers, terms }) : may
}

async function open(
  tx: Transaction,
  { run, workshop, offers, terms }: Opening,
  byPersonId: string,
  now: Date,
): Promise<Result<{ bulk: string }, string>> {
  const opensToAllAt = new Date(now.getTime() + run.headStartHours * 3_600_000)
  const change = { openedAt: now, opensToAllAt, termsVersionId: terms!.id }
  const moved = await moveRun(tx, run, 'open_deposits', { now, byPersonId, change })
  if (!moved.ok) return moved
  if (workshop.payoutsManualAt === null) await workshop.update({ payoutsManualAt: now }, { transaction: tx })
  await copyBasePlan(tx, { run, byPersonId, now })
  await setRunDues(tx, run, workshop.timeZone, now)
  await setDigestDue(tx, workshop, now)
  await pageChanged(tx, paths.home)
  await recordDecision(tx, {
    run,
    kind: 'open_deposits',
    reason: null,
    inputs: { offers: offers.map((offer) => offer.facts()), terms: terms!.number },
    figures: { minimum: run.minimum, maximum: run.maximum, decideBy: run.decideByOn },
    byPersonId,
    now,
  })
  const confirmed = await SignUp.findAll({
    where: { moduleId: run.moduleId, state: 'confirmed' },
    attributes: ['id'],
    order: [
      ['confirmedAt', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction: tx,
  })
  const subjectIds = confirmed.map(({ id }) => id)
  const bulk = await startBulk(tx, { kind: 'invite', run, subjectIds, byPersonId, now })
  return ok({ bulk: bulk.id })
}
