import { z } from 'zod'
import { pdfAnswer } from '@/app/(packing)/packing/[workshop]/_parts/pdf-answer'
import { slug } from '@/lib/contracts/fields'
import { PaperQuery } from '@/lib/contracts/packing'
import { refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { packingWords } from '@/lib/messages/packing'
import { fulfilmentListPdf } from '@/lib/papers/fulfilment-list'
import { getFulfilmentOrders } from '@/lib/queries/packing/get-fulfilment-orders'

export const GET = route(
  { deed: 'paper:print', params: z.object({ workshop: slug }), query: PaperQuery },
  async ({ actor, workshop, query, now }) => {
    const paper = await getFulfilmentOrders({ actor, workshopId: workshop.id, query, now })
    if (!paper) return refuse('not_found')
    const size = query.size ?? (paper.usesLetter ? 'Letter' : 'A4')
    const title = packingWords.listName(paper.runs)
    return pdfAnswer(await fulfilmentListPdf({ ...paper, size, title }), `list-${paper.printedOn}.pdf`)
  },
)
