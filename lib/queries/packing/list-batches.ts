import 'server-only'
import { QueryTypes } from 'sequelize'
import type { BatchRow } from '@/lib/contracts/packing'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

const MOST = 20

/** Batches under way, then those closed last, twenty at most; or one by its id. One statement. */
export async function listBatches(cmd: {
  actor: Actor
  workshopId: string
  batchId?: string
}): Promise<BatchRow[]> {
  const { actor, workshopId, batchId } = cmd
  if (actor.kind !== 'person' || !can(actor, 'packing:read', { workshopId })) return []
  const rows = await sequelize.query<Omit<BatchRow, 'closedAt'> & { closedAt: Date | null }>(
    `select b.id as batch, b.name, coalesce(pe.name, split_part(pe.email_normal, '@', 1)) as packer, b.packer_person_id = $me as "isMine", b.closed_at as "closedAt",
            count(p.id)::int as total,
            (count(p.id) filter (where p.state = 'packed'))::int as packed,
            (count(p.id) filter (where p.handed_over_at is not null))::int as posted
     from pack_batches b join people pe on pe.id = b.packer_person_id
     left join parcels p on p.batch_id = b.id and p.state <> 'discarded'
     where b.workshop_id = $workshopId and ($batchId::uuid is null or b.id = $batchId)
     group by b.id, pe.id order by b.closed_at desc nulls first, b.created_at limit $most`,
    {
      bind: { workshopId, me: actor.personId, batchId: batchId ?? null, most: MOST },
      type: QueryTypes.SELECT,
    },
  )
  return rows.map((row) => ({ ...row, closedAt: row.closedAt?.toISOString() ?? null }))
}
