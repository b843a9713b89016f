import { z } from 'zod'
import { pdfAnswer } from '@/app/(packing)/packing/[workshop]/_parts/pdf-answer'
import { slipsToPrint } from '@/app/(packing)/packing/[workshop]/_parts/slips-to-print'
import { slug } from '@/lib/contracts/fields'
import { PaperQuery } from '@/lib/contracts/packing'
import { refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { packingSlipsPdf } from '@/lib/papers/packing-slips'

export const GET = route(
  { deed: 'paper:print', params: z.object({ workshop: slug }), query: PaperQuery },
  async ({ actor, workshop, query, now }) => {
    const paper = await slipsToPrint({ actor, workshopId: workshop.id, of: { query }, now })
    if (!paper) return refuse('not_found')
    const size = query.size ?? (paper.usesLetter ? 'Letter' : 'A4')
    return pdfAnswer(await packingSlipsPdf({ ...paper, size }), `slips-${paper.printedOn}.pdf`)
  },
)
