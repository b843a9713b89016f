import 'server-only'
import type { PostColumn, PostQuery } from '@/lib/contracts/tracking'
import { can, type Actor } from '@/lib/core/policy/can'
import { plainMoney } from '@/lib/core/money/plain'
import { getParcelPapers } from '@/lib/queries/packing/get-parcel-papers'
import { listPackedParcels } from '@/lib/queries/packing/list-packed-parcels'
import { Parcel } from '@/models'

const MOST = 5000

type Row = Readonly<Record<PostColumn, string>>

/**
 * Packed parcels as a carrier's upload wants them, in Latin letters, a line each; nobody but who may export gets any. Bounded:
 * a statement per table, however many parcels.
 */
export async function listPostRows(cmd: {
  actor: Actor
  workshopId: string
  query: PostQuery
  now: Date
}): Promise<Row[]> {
  const { actor, workshopId, query, now } = cmd
  if (!can(actor, 'post:export', { workshopId })) return []
  const packed = { actor, workshopId, show: 'packed', batch: query.batch, now, limit: MOST } as const
  const { items } = await listPackedParcels(packed)
  const parcelIds = items.map(({ parcel }) => parcel)
  const papers = await getParcelPapers({ actor, workshopId, parcelIds, now })
  const rows = await Parcel.findAll({ where: { id: parcelIds }, include: ['address'] })
  const byId = new Map(rows.map((row) => [row.id, row]))
  return (papers?.parcels ?? []).map((paper): Row => {
    const { customs } = paper
    const parcel = byId.get(paper.parcel)!
    const address = parcel.address!.facts()
    const own = address.latin ?? address
    const each = (of: 'description' | 'code' | 'origin') =>
      [...new Set(customs.lines.map((line) => line[of]))].join(' / ')
    return {
      order: paper.orderNumber,
      parcel: String(paper.number),
      name: own.name,
      organization: own.organization ?? '',
      line1: own.lines[0] ?? '',
      line2: own.lines[1] ?? '',
      line3: own.lines.slice(2).join(', '),
      city: own.city ?? '',
      region: own.region ?? '',
      postcode: address.postcode ?? '',
      country: address.country,
      phone: paper.phone ?? '',
      taxNumber: paper.taxNumber ?? '',
      service: paper.service ?? '',
      grams: String(paper.grams ?? ''),
      lengthMm: String(parcel.lengthMm ?? ''),
      widthMm: String(parcel.widthMm ?? ''),
      heightMm: String(parcel.heightMm ?? ''),
      contents: each('description'),
      code: each('code'),
      origin: each('origin'),
      value: plainMoney(customs.valueMinor, customs.currency),
      currency: customs.currency,
      form: customs.form === 'none' ? '' : customs.form,
    }
  })
}
