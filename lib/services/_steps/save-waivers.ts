import 'server-only'
import type { Transaction } from 'sequelize'
import type { Waiver as WaiverFacts } from '@/lib/core/states/run-readiness'
import { type Run, Waiver } from '@/models'

/**
 * Writes down which readiness lines of a run are let pass, and why; a second reason for the same line replaces the first.
 * The run is locked by the caller. Writes: waivers. Repeat: safe.
 */
export async function saveWaivers(
  tx: Transaction,
  run: Run,
  waivers: readonly WaiverFacts[],
  by: { personId: string; now: Date },
): Promise<void> {
  for (const { key, reason } of waivers) {
    const words = { reason, byPersonId: by.personId, at: by.now }
    const [row, isNew] = await Waiver.findOrCreate({
      where: { runId: run.id, key },
      defaults: { workshopId: run.workshopId, runId: run.id, key, ...words },
      transaction: tx,
    })
    if (!isNew) await row.update(words, { transaction: tx })
  }
}
