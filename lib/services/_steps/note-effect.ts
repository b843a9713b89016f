import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'

/**
 * Claims one transition of an object of the provider: true for the first who does, so that a change that arrives as two
 * events has its effect once.
 * Locks: the second waits for the first's transaction. Writes: one row. Repeat: false.
 */
export async function noteEffect(
  tx: Transaction,
  effect: { account: string; objectId: string; transition: string; eventId: string | null; now: Date },
): Promise<boolean> {
  const { now, ...bind } = effect
  const rows = await sequelize.query(
    `insert into provider_effects (account, object_id, transition, provider_event_id, at)
     values ($account, $objectId, $transition, $eventId, $at)
     on conflict (account, object_id, transition) do nothing returning id`,
    { bind: { ...bind, at: now.toISOString() }, type: QueryTypes.SELECT, transaction: tx },
  )
  return rows.length > 0
}
