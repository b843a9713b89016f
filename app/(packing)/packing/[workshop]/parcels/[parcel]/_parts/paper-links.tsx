import { LinkButton } from '@/components/ui/button'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

/** The slip of this parcel, on a page that prints and as PDF. */
export function PaperLinks({ slug, parcel }: { slug: string; parcel: string }) {
  return (
    <div className="flex flex-wrap items-center gap-x-6 pt-4 print:hidden">
      <LinkButton href={paths.packingSlip(slug, parcel)}>{words.slip}</LinkButton>
      <a href={paths.api.packingSlip(slug, parcel)} className="inline-flex min-h-14 items-center">
        {words.slipPdf}
      </a>
    </div>
  )
}
