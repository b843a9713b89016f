import { z } from 'zod'
import { pdfAnswer } from '@/app/(packing)/packing/[workshop]/_parts/pdf-answer'
import { slipsToPrint } from '@/app/(packing)/packing/[workshop]/_parts/slips-to-print'
import { slug, uuid } from '@/lib/contracts/fields'
import { PaperQuery } from '@/lib/contracts/packing'
import { refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { packingSlipsPdf } from '@/lib/papers/packing-slips'

export const GET = route(
  {
    deed: 'paper:print',
    params: z.object({ workshop: slug, parcel: uuid }),
    query: PaperQuery.pick({ size: true }),
  },
  async ({ actor, workshop, params, query, now }) => {
    const of = { parcel: params.parcel }
    const paper = await slipsToPrint({ actor, workshopId: workshop.id, of, now })
    if (!paper) return refuse('not_found')
    const size = query.size ?? (paper.usesLetter ? 'Letter' : 'A4')
    const name = `slip-${paper.slips[0]?.orderNumber}.pdf`
    return pdfAnswer(await packingSlipsPdf({ ...paper, size }), name)
  },
)
