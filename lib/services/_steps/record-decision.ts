import 'server-only'
import type { Transaction } from 'sequelize'
import { CORE_VERSION } from '@/lib/core/version'
import { Decision, type Run } from '@/models'
import type { DecisionKind } from '@/models/words'

/**
 * Freezes a decision with what it was taken on. Never changed afterwards.
 * Locks: nothing. Writes: one decision. Repeat: writes another; the run's state keeps that from happening.
 */
export async function recordDecision(
  tx: Transaction,
  given: {
    run: Run
    kind: DecisionKind
    reason: string | null
    inputs: object
    figures: object
    byPersonId: string | null
    now: Date
  },
): Promise<void> {
  const { run, now, inputs, figures, ...rest } = given
  await Decision.create(
    {
      ...rest,
      workshopId: run.workshopId,
      runId: run.id,
      inputs: { ...inputs },
      figures: { ...figures },
      coreVersion: CORE_VERSION,
      at: now,
    },
    { transaction: tx },
  )
}
