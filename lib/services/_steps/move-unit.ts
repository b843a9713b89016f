import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, type Result } from '@/lib/core/result'
import { next, UNIT_MOVES, type UnitEvent } from '@/lib/core/states/unit'
import { recordMove } from '@/lib/services/_steps/record-move'
import type { Unit } from '@/models'

/**
 * Moves a unit the caller has locked. `orderLineId` is the line it is allocated to, null when it is released.
 * Refuses: not_allowed. Writes: the unit and its audit entry. Repeat: refused, the state has changed.
 */
export async function moveUnit(
  tx: Transaction,
  unit: Unit,
  event: UnitEvent,
  by: { now: Date; byPersonId: string | null; orderLineId?: string | null },
): Promise<Result<Unit, 'not_allowed'>> {
  const from = unit.state
  const to = next(UNIT_MOVES, from, event)
  if (!to.ok) return to
  const allocated = by.orderLineId === undefined ? {} : { orderLineId: by.orderLineId }
  await unit.update({ ...allocated, state: to.value }, { transaction: tx })
  await recordMove(tx, {
    workshopId: unit.workshopId,
    subjectType: 'unit',
    subjectId: unit.id,
    from,
    event,
    to: to.value,
    byPersonId: by.byPersonId,
    at: by.now,
  })
  return ok(unit)
}
