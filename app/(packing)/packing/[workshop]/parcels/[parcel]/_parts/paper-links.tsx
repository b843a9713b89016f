import { LinkButton } from '@/components/ui/button'
import { withParams } from '@/components/ui/with-params'
import { packingWords as words } from '@/lib/messages/packing'
import { parcelPaperWords } from '@/lib/messages/parcel-papers'
import { paths } from '@/lib/paths'

const PAPERS = ['labels', 'customs', 'invoices', 'returns'] as const

/** The papers of this parcel, on pages that print and offer the PDF. */
export function PaperLinks({ slug, parcel }: { slug: string; parcel: string }) {
  return (
    <div className="flex flex-wrap items-center gap-x-6 pt-4 print:hidden">
      <LinkButton href={paths.packingSlip(slug, parcel)}>{words.slip}</LinkButton>
      <a href={paths.api.packingSlip(slug, parcel)} className="inline-flex min-h-14 items-center">
        {words.slipPdf}
      </a>
      {PAPERS.map((paper) => (
        <a
          key={paper}
          href={withParams(paths.packingPapers(slug, paper), { parcel }, {})}
          className="inline-flex min-h-14 items-center"
        >
          {parcelPaperWords.names[paper]}
        </a>
      ))}
    </div>
  )
}
