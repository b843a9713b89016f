import 'server-only'
import type { PackInput } from '@/lib/contracts/packing'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { weightCheck } from '@/lib/core/post/weight-check'
import { ok, refuse } from '@/lib/core/result'
import { mayPack } from '@/lib/core/states/order-guards'
import { inTransaction } from '@/lib/db/in-transaction'
import { papers } from '@/lib/messages/papers'
import { lockParcel } from '@/lib/services/_steps/lock-parcel'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { moveParcel } from '@/lib/services/_steps/move-parcel'
import { parcelMayGoOut } from '@/lib/services/_steps/parcel-may-go-out'
import type { ParcelLine } from '@/models'
import { checkPackedLines, type ExpectedLine } from '@/lib/services/_steps/check-packed-lines'
import { fillWithUnits } from '@/lib/services/_steps/fill-with-units'
import { findSerials } from '@/lib/services/_steps/find-serials'
import { unitsLeft } from '@/lib/services/_steps/units-left'

/**
 * Packs a parcel: its own lines, each once and whole, weighed. The order is packed when all of it is in packed parcels.
 * Refuses: not_found · forbidden · already_packed · already_handed_over · parcel_discarded · order_cancelled ·
 * order_not_paid · order_disputed · destination_paused · on_hold · label_void · in_other_batch · invalid, with a sentence per field ·
 * weight_surprise, when the scale differs by more than the tolerance and nobody confirmed it.
 * Locks: run, order, parcel, the run's units where serial numbers are given. Writes: parcel, its lines, units, order,
 * audit. Repeat: refused as already_packed.
 */
export function packParcel(cmd: {
  actor: Actor
  workshopId: string
  parcelId: string
  input: PackInput
  now: Date
}) {
  const { actor, workshopId, parcelId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'parcel:pack', { workshopId })) return refuse('forbidden')
    const locked = await lockParcel(tx, { workshopId, parcelId })
    if (!locked) return refuse('not_found')
    const { order, parcel, lines } = locked
    if (parcel.handedOverAt !== null) return refuse('already_handed_over')
    const may = await parcelMayGoOut(tx, locked, actor.personId)
    if (!may.ok) return may
    if (parcel.state !== 'open')
      return refuse(parcel.state === 'packed' ? 'already_packed' : 'parcel_discarded')

    const mistakes = checkPackedLines(lines.map(asExpected), input.lines)
    if (mistakes) return refuseFields(mistakes)
    const orderLines = lines.map((line) => line.orderLine!)
    const { units, errors } = await findSerials(tx, orderLines, locked.run.id, input.lines)
    if (Object.keys(errors).length > 0) return refuseFields(errors)
    const expectedGrams = expectedOf(lines)
    const surprising = isSurprising(lines, expectedGrams, input.grams)
    if (surprising && !input.weightConfirmed) return refuse('weight_surprise')

    const by = { now, byPersonId: actor.personId }
    await fillWithUnits(tx, parcel, lines, units, by)
    const packed = await moveParcel(tx, parcel, 'pack', {
      ...by,
      change: {
        grams: input.grams,
        lengthMm: input.lengthMm ?? null,
        widthMm: input.widthMm ?? null,
        heightMm: input.heightMm ?? null,
        expectedGrams,
        weightConfirmedAt: surprising ? now : null,
        packedAt: now,
        packedByPersonId: actor.personId,
      },
    })
    if (!packed.ok) return packed
    const unitsUnpacked = await unitsLeft(tx, order.id, 'packed')
    if (
      parcel.problemId === null &&
      mayPack({ disputed: false, destinationPaused: false, unitsUnpacked }).ok
    ) {
      const whole = await moveOrder(tx, order, 'pack', by)
      if (!whole.ok) return whole
    }
    return ok({ parcel: parcel.id, state: parcel.state, order: order.state })
  })
}

function asExpected({ orderLine, quantity }: ParcelLine): ExpectedLine {
  const line = orderLine!
  const answers = line.choices.map(({ label }) => label)
  const name = [`${quantity} × ${papers.offers[line.offerKind]}`, ...answers].join(', ')
  return { line: line.id, quantity, name }
}

const packedGrams = ({ orderLine }: ParcelLine) => orderLine!.runOffer!.offer!.packedWeightG

function expectedOf(lines: readonly ParcelLine[]): number | null {
  const grams = lines.map((line) => ({ each: packedGrams(line), quantity: line.quantity }))
  if (grams.some(({ each }) => each === null)) return null
  return grams.reduce((sum, { each, quantity }) => sum + quantity * each!, 0)
}

/** An offer nobody has weighed yet gives nothing to compare with. */
function isSurprising(lines: readonly ParcelLine[], expectedGrams: number | null, grams: number): boolean {
  if (expectedGrams === null) return false
  const lightestGrams = Math.min(...lines.map((line) => packedGrams(line)!))
  return weightCheck({ expectedGrams, grams, lightestGrams }).isSurprising
}
