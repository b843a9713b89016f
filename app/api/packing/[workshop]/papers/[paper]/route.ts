import { z } from 'zod'
import { paperToPrint } from '@/app/(packing)/packing/[workshop]/_parts/paper-to-print'
import { pdfAnswer } from '@/app/(packing)/packing/[workshop]/_parts/pdf-answer'
import { slug } from '@/lib/contracts/fields'
import { paperKind, ParcelPaperQuery } from '@/lib/contracts/packing'
import { refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { paperPdf } from '@/lib/papers/paper-pdf'

export const GET = route(
  {
    deed: 'paper:print',
    params: z.object({ workshop: slug, paper: paperKind }),
    query: ParcelPaperQuery,
  },
  async ({ actor, workshop, params, query, now }) => {
    const kind = params.paper
    const built = await paperToPrint({ actor, workshopId: workshop.id, kind, query, now })
    if (!built) return refuse('not_found')
    if (built.parts.length === 0)
      return refuse(built.blocked.length > 0 ? 'declaration_incomplete' : 'nothing_to_print')
    const size = query.size ?? (kind === 'labels' ? 'A6' : built.usesLetter ? 'Letter' : 'A4')
    return pdfAnswer(await paperPdf({ ...built.issue, size }, built.name, built.parts), `${kind}.pdf`)
  },
)
