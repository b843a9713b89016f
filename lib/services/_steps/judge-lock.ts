import 'server-only'
import type { Transaction } from 'sequelize'
import { isConfirmedBy } from '@/lib/contracts/bulk'
import { refuseFields } from '@/lib/contracts/problem'
import type { LockInput } from '@/lib/contracts/runs'
import { ok, refuse } from '@/lib/core/result'
import { mayLock, readinessOf } from '@/lib/core/states/run-guards'
import { next, RUN_MOVES } from '@/lib/core/states/run'
import { runWords } from '@/lib/messages/runs'
import { figuresOf } from '@/lib/queries/runs/figures-of'
import { getRunFacts } from '@/lib/queries/runs/get-run-facts'
import { readinessFactsOf } from '@/lib/queries/runs/readiness-facts-of'
import { copyBasePlan } from '@/lib/services/_steps/copy-base-plan'
import { saveWaivers } from '@/lib/services/_steps/save-waivers'
import { Module, type Run } from '@/models'

export type LockAsked = {
  input: LockInput & { typed?: string | undefined }
  personId: string
  /** What lies at the provider; null when it did not answer. */
  balanceMinor: number | null
  now: Date
}

/**
 * Judges whether a run may be locked, on its figures and readiness list as they are in this transaction; waivers handed in
 * count already. The run is locked by the caller.
 * Refuses: not_allowed · invalid (other words typed) · below_minimum · not_ready · session_open · attempt_unknown.
 * Writes: waivers, the plan of a run that had none. Repeat: safe.
 */
export async function judgeLock(
  tx: Transaction,
  run: Run,
  asked: LockAsked,
  open: { openSessions: number; unknownAttempts: number },
) {
  const { input, personId, balanceMinor, now } = asked
  if (!next(RUN_MOVES, run.state, 'lock').ok) return refuse('not_allowed')
  const module = await Module.findByPk(run.moduleId, { transaction: tx, rejectOnEmpty: true })
  if (input.typed !== undefined && !isConfirmedBy(input.typed, runWords.confirmLock(module.slug)))
    return refuseFields({ typed: runWords.typedDiffers })
  await saveWaivers(tx, run, input.waivers ?? [], { personId, now })
  await copyBasePlan(tx, { run, byPersonId: personId, now })
  const facts = await getRunFacts({ workshopId: run.workshopId, runId: run.id, now, tx })
  if (!facts) return refuse('not_found')
  const { figures, weighed } = figuresOf(facts)
  const readiness = readinessOf(readinessFactsOf(facts, balanceMinor))
  const may = mayLock({
    deposited: figures.deposited,
    minimum: run.minimum,
    reason: input.reason ?? null,
    readiness,
    ...open,
  })
  return may.ok ? ok({ facts, figures, weighed, readiness }) : may
}
