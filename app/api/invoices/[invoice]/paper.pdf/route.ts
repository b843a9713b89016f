import { z } from 'zod'
import { pdfAnswer } from '@/app/(packing)/packing/[workshop]/_parts/pdf-answer'
import { uuid } from '@/lib/contracts/fields'
import { refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { invoicePdf } from '@/lib/papers/invoice'
import { getInvoicePaper } from '@/lib/queries/invoices/get-invoice-paper'

export const GET = route(
  { signedIn: true, params: z.object({ invoice: uuid }) },
  async ({ actor, params }) => {
    const paper = await getInvoicePaper({ actor, invoiceId: params.invoice })
    if (!paper) return refuse('not_found')
    return pdfAnswer(await invoicePdf(paper), `${paper.kind}-${paper.number}.pdf`)
  },
)
