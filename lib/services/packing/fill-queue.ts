import 'server-only'
import { QueryTypes } from 'sequelize'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { openParcelForOrder } from '@/lib/services/_steps/open-parcel-for-order'

/**
 * Opens the parcels of paid orders that could not be packed when they were paid: the dispute has ended, the destination is
 * open again, the units have passed. Oldest promise first, so that scarce units go where they are due.
 * Refuses: forbidden. Locks: one order with its run at a time, a transaction each. Writes: parcels, audit. Repeat: safe.
 */
export async function fillQueue(cmd: {
  actor: Actor
  workshopId: string
  now: Date
}): Promise<Result<{ opened: number }, 'forbidden'>> {
  const { actor, workshopId, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'parcel:open', { workshopId })) return refuse('forbidden')
  const waiting = await sequelize.query<{ id: string }>(
    `select o.id from orders o join order_lines ol on ol.order_id = o.id
     where o.workshop_id = $workshopId and o.state = 'paid' and o.disputed_at is null and o.address_id is not null
     group by o.id
     having sum(ol.quantity) > (select coalesce(sum(pl.quantity), 0) from parcel_lines pl
                                join parcels p on p.id = pl.parcel_id join order_lines l on l.id = pl.order_line_id
                                where l.order_id = o.id and p.problem_id is null and p.state <> 'discarded')
     order by min(coalesce(ol.revised_posted_by_on, ol.posted_by_on)), o.number`,
    { bind: { workshopId }, type: QueryTypes.SELECT },
  )
  let opened = 0
  for (const { id } of waiting) {
    const filled = await inTransaction(async (tx) => {
      const locked = await lockOrder(tx, id)
      return ok(locked && (await openParcelForOrder(tx, locked.order, now)))
    })
    if (filled.ok && filled.value) opened += 1
  }
  return ok({ opened })
}
