import type { PaperKind, ParcelPaperQuery } from '@/lib/contracts/packing'
import type { Actor } from '@/lib/core/policy/can'
import { papers as paperWords } from '@/lib/messages/papers'
import { buildPaper } from '@/lib/papers/parcel-papers'
import { PAPERS_MOST } from '@/lib/queries/packing/get-fulfilment-orders'
import { getParcelPapers } from '@/lib/queries/packing/get-parcel-papers'
import { listBags } from '@/lib/queries/packing/list-bags'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { listPackedParcels } from '@/lib/queries/packing/list-packed-parcels'
import { notePrinted } from '@/lib/services/packing/note-printed'

type Asked = { actor: Actor; workshopId: string; kind: PaperKind; query: ParcelPaperQuery; now: Date }

/**
 * A paper of one parcel, of a batch or of the queue. Labels are noted as printed before their addresses are read: an
 * address that changes after that makes them void. Null for who may not print.
 */
export async function paperToPrint({ actor, workshopId, kind, query, now }: Asked) {
  const asked = { actor, workshopId }
  const { parcelIds, isCut } = await parcelsFor({ ...asked, now }, kind, query)
  if (kind === 'labels') await notePrinted({ ...asked, parcelIds, now })
  const papers = await getParcelPapers({ ...asked, parcelIds, now })
  if (!papers) return null
  const bags =
    kind === 'bags'
      ? await listBags({ ...asked, parcelIds, offerName: (offer) => paperWords.offers[offer] })
      : []
  const { usesLetter, workshop, printedBy, printedOn } = papers
  return { ...buildPaper(kind, papers, bags), issue: { workshop, printedBy, printedOn }, usesLetter, isCut }
}

async function parcelsFor(
  asked: { actor: Actor; workshopId: string; now: Date },
  kind: PaperKind,
  { parcel, ...query }: ParcelPaperQuery,
): Promise<{ parcelIds: string[]; isCut: boolean }> {
  if (parcel) return { parcelIds: [parcel], isCut: false }
  const packed = { ...asked, show: 'packed', batch: query.batch, limit: PAPERS_MOST } as const
  const { items, next } =
    kind === 'hand-over'
      ? await listPackedParcels(packed)
      : await listPackQueue({ ...asked, query, limit: PAPERS_MOST })
  return { parcelIds: items.map((item) => item.parcel), isCut: next !== null }
}
