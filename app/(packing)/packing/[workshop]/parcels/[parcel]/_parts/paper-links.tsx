import { LinkButton } from '@/components/ui/button'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

/** The slip of this parcel, on a page that prints and as PDF. */
export function PaperLinks({ slug, parcel }: { slug: string; parcel: string }) {
  return (
    <div className="flex flex-wrap gap-3 pt-4 print:hidden">
      <LinkButton href={paths.packingSlip(slug, parcel)}>{words.slip}</LinkButton>
      <LinkButton kind="plain" href={paths.api.packingSlip(slug, parcel)}>
        {words.slipPdf}
      </LinkButton>
    </div>
  )
}
