import 'server-only'
import { QueryTypes } from 'sequelize'
import type { StockInput } from '@/lib/contracts/part-forms'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { Part, StockMove } from '@/models'
import { refreshPlansOfPart } from '../_steps/refresh-plans-of-part'

/**
 * Records what was counted of a part: the difference to what was thought to be there becomes a move.
 * Refuses: forbidden · not_found. Locks: the part. Writes: a move where the count differs, base plans. Repeat: safe.
 */
export function countStock(cmd: { actor: Actor; workshopId: string; input: StockInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'stock:write', { workshopId })) return refuse('forbidden')
    const part = await Part.findOne({
      where: { workshopId, id: input.part },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!part) return refuse('not_found')
    const [before] = await sequelize.query<{ onHand: number }>(
      'select coalesce(sum(change), 0)::int as "onHand" from stock_moves where part_id = $partId',
      { bind: { partId: part.id }, type: QueryTypes.SELECT, transaction: tx },
    )
    const change = input.onHand - (before?.onHand ?? 0)
    if (change !== 0) {
      const by = { byPersonId: actor.personId, at: now }
      await StockMove.create(
        { workshopId, partId: part.id, change, cause: 'counted', note: input.note ?? '', ...by },
        { transaction: tx },
      )
      await refreshPlansOfPart(tx, { partId: part.id, byPersonId: actor.personId, now })
    }
    return ok({ part: part.id, onHand: input.onHand })
  })
}
