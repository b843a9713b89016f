import 'server-only'
import { fn, col, Op, type Transaction, where } from 'sequelize'
import { refuseFields } from '@/lib/contracts/problem'
import type { RecordUnitsInput } from '@/lib/contracts/units'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { next, UNIT_MOVES } from '@/lib/core/states/unit'
import { inTransaction } from '@/lib/db/in-transaction'
import { unitMistakes as words } from '@/lib/messages/units'
import { readUnits, type TypedUnit } from '@/lib/services/_steps/read-units'
import { recordMove } from '@/lib/services/_steps/record-move'
import { Run, RunOffer, Unit } from '@/models'

/**
 * Enters finished units of a run that passed their tests elsewhere, by serial number; all of them or none.
 * Refuses: forbidden · not_found · invalid, at `serials`, naming the line: unreadable, named twice, known already, a form
 * this run does not sell. Locks: the run. Writes: units, audit. Repeat: refused, the numbers are known.
 */
export function recordUnits(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  input: RecordUnitsInput
  now: Date
}) {
  const { actor, workshopId, runId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'unit:import', { workshopId })) return refuse('forbidden')
    const run = await Run.findOne({
      where: { id: runId, workshopId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!run) return refuse('not_found')
    const read = readUnits(input.serials, input.offer)
    if (!read.ok) return refuseFields({ serials: read.reason })
    const mistake = await mistakeOf(tx, run, read.value)
    if (mistake) return refuseFields({ serials: mistake })
    for (const typed of read.value) await enter(tx, run, typed, { now, byPersonId: actor.personId })
    return ok({ entered: read.value.length })
  })
}

async function mistakeOf(tx: Transaction, run: Run, units: TypedUnit[]): Promise<string | null> {
  const sold = await RunOffer.findAll({
    where: { runId: run.id },
    include: [{ association: 'offer', attributes: ['kind'] }],
    transaction: tx,
  })
  const kinds = sold.map(({ offer }) => offer?.kind)
  const unsold = units.find(({ offer }) => !kinds.includes(offer))
  if (unsold) return words.notSold(unsold.line)
  const serials = units.map(({ serial }) => serial.toUpperCase())
  const known = await Unit.findAll({
    where: {
      [Op.and]: [{ workshopId: run.workshopId }, where(fn('upper', col('serial')), { [Op.in]: serials })],
    },
    attributes: ['serial'],
    transaction: tx,
  })
  const taken = new Set(known.map(({ serial }) => serial.toUpperCase()))
  const first = units.find(({ serial }) => taken.has(serial.toUpperCase()))
  return first ? words.known(first.line, first.serial) : null
}

async function enter(
  tx: Transaction,
  run: Run,
  { serial, offer }: TypedUnit,
  by: { now: Date; byPersonId: string },
): Promise<void> {
  const started = next(UNIT_MOVES, null, 'start')
  const passed = started.ok ? next(UNIT_MOVES, started.value, 'pass') : started
  if (!passed.ok) throw new Error('a unit that began cannot pass')
  const unit = await Unit.create(
    {
      workshopId: run.workshopId,
      revisionId: run.revisionId,
      runId: run.id,
      offerKind: offer,
      serial,
      state: passed.value,
      startedAt: by.now,
      passedAt: by.now,
    },
    { transaction: tx },
  )
  await recordMove(tx, {
    workshopId: run.workshopId,
    subjectType: 'unit',
    subjectId: unit.id,
    from: null,
    event: 'pass',
    to: passed.value,
    byPersonId: by.byPersonId,
    at: by.now,
  })
}
