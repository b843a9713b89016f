import 'server-only'
import { Op, type Transaction } from 'sequelize'
import type { HandOverInput } from '@/lib/contracts/packing'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { readTracking } from '@/lib/core/post/tracking'
import { ok, refuse } from '@/lib/core/result'
import { addDays } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { packingMistakes as words } from '@/lib/messages/packing'
import { chooseService } from '@/lib/services/_steps/choose-service'
import { closeBatchIfDone } from '@/lib/services/_steps/close-batch-if-done'
import { countRevenue } from '@/lib/services/_steps/count-revenue'
import { type LockedParcel, lockParcel } from '@/lib/services/_steps/lock-parcel'
import { mailHandOver } from '@/lib/services/_steps/mail-hand-over'
import { modulePageChanged } from '@/lib/services/_steps/module-page-changed'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { moveParcel } from '@/lib/services/_steps/move-parcel'
import { moveUnit } from '@/lib/services/_steps/move-unit'
import { parcelMayGoOut } from '@/lib/services/_steps/parcel-may-go-out'
import { unitsLeft } from '@/lib/services/_steps/units-left'
import { Parcel, Workshop } from '@/models'

type Command = {
  actor: Actor
  workshopId: string
  parcelId: string
  input: HandOverInput
  now: Date
}

/**
 * Hands one packed parcel over; its refusals are those of `handOverParcel`. A number taken in before stays where none is
 * given.
 * Locks: run, order, parcel. Writes: parcel, units, order, ledger, mail, audit.
 */
export async function handOver(tx: Transaction, { actor, workshopId, parcelId, input, now }: Command) {
  if (actor.kind !== 'person' || !can(actor, 'parcel:hand_over', { workshopId })) return refuse('forbidden')
  const locked = await lockParcel(tx, { workshopId, parcelId })
  if (!locked) return refuse('not_found')
  const { order, parcel } = locked
  if (parcel.handedOverAt !== null) return refuse('already_handed_over')
  const may = await parcelMayGoOut(tx, locked, actor.personId)
  if (!may.ok) return may
  if (parcel.state !== 'packed') return refuse(parcel.state === 'open' ? 'not_packed' : 'parcel_discarded')

  const chosen = await chooseService(tx, parcel, order.country, input.service)
  const tracking = await trackingOf(tx, parcel, input.tracking)
  const errors = {
    ...(chosen.mistake && { service: chosen.mistake }),
    ...(tracking.mistake && { tracking: tracking.mistake }),
  }
  if (Object.keys(errors).length > 0) return refuseFields(errors)

  const workshop = await Workshop.findByPk(workshopId, { transaction: tx, rejectOnEmpty: true })
  const today = dayIn(now, workshop.timeZone)
  const claimDays = chosen.service?.claimWithinDays ?? null
  const by = { now, byPersonId: actor.personId }
  const gone = await moveParcel(tx, parcel, 'hand_over', {
    ...by,
    change: {
      serviceId: chosen.service?.id ?? null,
      serviceName: chosen.name,
      tracking: tracking.number,
      trackingKind: tracking.kind,
      claimByOn: claimDays === null ? null : addDays(today, claimDays),
      handedOverAt: now,
      handedOverByPersonId: actor.personId,
    },
  })
  if (!gone.ok) return gone
  await postUnits(tx, locked, by)
  await closeBatchIfDone(tx, parcel.batchId, now)
  const more = parcel.problemId === null && (await unitsLeft(tx, order.id, 'handed_over')) > 0
  if (!more && parcel.problemId === null) {
    const posted = await moveOrder(tx, order, 'hand_over', by)
    if (!posted.ok) return posted
    await countRevenue(tx, order, now)
    await modulePageChanged(tx, locked.run.moduleId)
  }
  await mailHandOver(tx, locked, { service: chosen.service, workshop, today, more, now })
  return ok({ parcel: parcel.id, state: parcel.state, order: order.state, tracking: parcel.tracking })
}

type ReadTracking = { number: string | null; kind: 's10' | 'other' | null; mistake: string | null }

async function trackingOf(tx: Transaction, parcel: Parcel, typed?: string): Promise<ReadTracking> {
  if (typed === undefined) return { number: parcel.tracking, kind: parcel.trackingKind, mistake: null }
  const read = readTracking(typed)
  if (!read.ok) return { number: null, kind: null, mistake: words.tracking[read.reason] }
  const other = await Parcel.findOne({
    where: { workshopId: parcel.workshopId, tracking: read.value.number, id: { [Op.ne]: parcel.id } },
    attributes: ['number'],
    transaction: tx,
  })
  return { ...read.value, mistake: other && words.trackingTaken(other.number) }
}

async function postUnits(tx: Transaction, { lines }: LockedParcel, by: { now: Date; byPersonId: string }) {
  for (const { unit } of lines) {
    if (!unit) continue
    const posted = await moveUnit(tx, unit, 'hand_over', by)
    if (!posted.ok) throw new Error(`unit ${unit.id} cannot be handed over from ${unit.state}`)
  }
}
