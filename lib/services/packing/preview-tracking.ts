import 'server-only'
import type { TrackingRow } from '@/lib/contracts/tracking'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { matchTracking } from '@/lib/services/_steps/match-tracking'
import { readTrackingCsv } from '@/lib/services/_steps/read-tracking-csv'

/**
 * What each line of a carrier's list would do, before anything is done.
 * Refuses: forbidden · a sentence, where it is no list. Locks: nothing. Writes: nothing.
 */
export async function previewTracking(cmd: {
  actor: Actor
  workshopId: string
  csv: string
}): Promise<Result<TrackingRow[], string>> {
  const { actor, workshopId, csv } = cmd
  if (!can(actor, 'tracking:import', { workshopId })) return refuse('forbidden')
  const read = readTrackingCsv(csv)
  return read.ok ? ok(await matchTracking(null, workshopId, read.value)) : read
}
