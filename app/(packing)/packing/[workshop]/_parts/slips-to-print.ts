import { env } from '@/lib/config/env'
import type { QueueQuery } from '@/lib/contracts/packing'
import type { Actor } from '@/lib/core/policy/can'
import { paths } from '@/lib/paths'
import { PAPERS_MOST } from '@/lib/queries/packing/get-fulfilment-orders'
import { getPackingSlips } from '@/lib/queries/packing/get-packing-slips'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { notePrinted } from '@/lib/services/packing/note-printed'

type Asked = { actor: Actor; workshopId: string; of: { parcel: string } | { query: QueueQuery }; now: Date }

/**
 * The slips of one parcel or of the queue, noted as printed before their addresses are read: an address that changes after
 * that makes them void again. Null where there is nothing to print.
 */
export async function slipsToPrint({ actor, workshopId, of, now }: Asked) {
  const queue =
    'query' in of ? await listPackQueue({ actor, workshopId, query: of.query, limit: PAPERS_MOST }) : null
  const parcelIds = 'parcel' in of ? [of.parcel] : (queue?.items ?? []).map(({ parcel }) => parcel)
  const noted = await notePrinted({ actor, workshopId, parcelIds, now })
  if (!noted.ok) return null
  const problemUrl = (order: string) => `${env().BASE_URL}${paths.accountOrder(order)}`
  const paper = await getPackingSlips({ actor, workshopId, parcelIds, problemUrl, now })
  return paper && paper.slips.length > 0 ? { ...paper, isCut: Boolean(queue?.next) } : null
}
