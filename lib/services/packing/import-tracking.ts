import 'server-only'
import type { Transaction } from 'sequelize'
import { refuseFields } from '@/lib/contracts/problem'
import type { TrackingInput, TrackingRow } from '@/lib/contracts/tracking'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { lockParcel } from '@/lib/services/_steps/lock-parcel'
import { matchTracking } from '@/lib/services/_steps/match-tracking'
import { readTrackingCsv } from '@/lib/services/_steps/read-tracking-csv'
import { recordMove } from '@/lib/services/_steps/record-move'
import { reportParcelState } from '@/lib/services/_steps/report-parcel'

/**
 * Takes a carrier's list in: tracking numbers and what arrived, matched by order number. Lines that cannot be taken are left
 * out and named; the rest stands or falls together.
 * Refuses: forbidden · look_first, until somebody has seen what each line does · invalid, at `csv`. Locks: run, order and
 * parcel of each line. Writes: parcels, orders, units, audit. Repeat: safe; a number taken in before changes nothing.
 */
export function importTracking(cmd: { actor: Actor; workshopId: string; input: TrackingInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'tracking:import', { workshopId })) return refuse('forbidden')
    const read = readTrackingCsv(input.csv)
    if (!read.ok) return refuseFields({ csv: read.reason })
    if (!input.confirmed) return refuse('look_first')
    const rows = await matchTracking(tx, workshopId, read.value)
    const by = { now, byPersonId: actor.personId }
    let taken = 0
    for (const row of rows) if (row.mistake === null) taken += await take(tx, workshopId, row, by)
    return ok({ taken, left: rows.filter(({ mistake }) => mistake !== null) })
  })
}

async function take(
  tx: Transaction,
  workshopId: string,
  row: TrackingRow,
  by: { now: Date; byPersonId: string },
): Promise<number> {
  const locked = await lockParcel(tx, { workshopId, parcelId: row.parcel! })
  if (!locked) return 0
  const { parcel } = locked
  if (row.tracking !== null && parcel.tracking === null) {
    await parcel.update({ tracking: row.tracking, trackingKind: row.kind }, { transaction: tx })
    await recordMove(tx, {
      ...{ workshopId, subjectType: 'parcel', subjectId: parcel.id, event: 'track', at: by.now },
      ...{ from: parcel.state, to: parcel.state, byPersonId: by.byPersonId },
    })
  }
  if (row.state !== null) await reportParcelState(tx, locked, row.state, by)
  return 1
}
