import 'server-only'
import { QueryTypes } from 'sequelize'
import type { PackedParcel } from '@/lib/contracts/packing'
import { can, type Actor } from '@/lib/core/policy/can'
import { isAddressShown } from '@/lib/core/post/address-shown'
import { sequelize } from '@/lib/db/sequelize'
import { ADDRESSEE } from '@/lib/queries/packing/in-queue'

const PER_PAGE = 50

/**
 * Packed parcels by number, or those handed over (whatever became of them), newest number first; `next` is the number to go
 * on from. Names leave with the address: blank once it is erased, and thirty days after the parcel arrived. One statement.
 */
export async function listPackedParcels(cmd: {
  actor: Actor
  workshopId: string
  show: 'packed' | 'handed_over'
  after?: number
  now: Date
  /** Only those of this batch. */
  batch?: string
  /** Items a page, 50 unless said. */
  limit?: number
}): Promise<{ items: PackedParcel[]; next: number | null }> {
  const { actor, workshopId, show, after, batch, now, limit = PER_PAGE } = cmd
  if (!can(actor, 'packing:read', { workshopId })) return { items: [], next: null }
  const isPacked = show === 'packed'
  const rows = await sequelize.query<
    Omit<PackedParcel, 'at' | 'orderNumber'> & { at: Date; orderNumber: number; deliveredAt: Date | null }
  >(
    `select p.id as parcel, p.number, min(o.number) as "orderNumber", ${ADDRESSEE} as name, a.country, p.grams,
            p.service_name as service, p.tracking, coalesce(p.handed_over_at, p.packed_at) as at,
            p.delivered_at as "deliveredAt"
     from parcels p join addresses a on a.id = p.address_id join parcel_lines pl on pl.parcel_id = p.id
     join order_lines ol on ol.id = pl.order_line_id join orders o on o.id = ol.order_id
     where p.workshop_id = $workshopId and ${isPacked ? "p.state = 'packed'" : 'p.handed_over_at is not null'}
       and ($batch::uuid is null or p.batch_id = $batch)
       and ($after::int is null or p.number ${isPacked ? '>' : '<'} $after)
     group by p.id, a.id order by p.number ${isPacked ? 'asc' : 'desc'} limit $limit`,
    {
      bind: { workshopId, batch: batch ?? null, after: after ?? null, limit: limit + 1 },
      type: QueryTypes.SELECT,
    },
  )
  const items = rows.slice(0, limit).map(({ deliveredAt, ...row }) => ({
    ...row,
    name: isAddressShown({ deliveredAt, now }) ? row.name : '',
    orderNumber: String(row.orderNumber),
    at: row.at.toISOString(),
  }))
  return { items, next: rows.length > limit ? (items.at(-1)?.number ?? null) : null }
}
