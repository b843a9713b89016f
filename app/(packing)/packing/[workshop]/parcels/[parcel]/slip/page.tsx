import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { z } from 'zod'
import { PageHead } from '@/components/ui/page-head'
import { businessNow } from '@/lib/http/business-now'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { packingDesk } from '../../../_parts/packing-desk'
import { SlipSheet } from '../../../_parts/slip-sheet'
import { slipsToPrint } from '../../../_parts/slips-to-print'

export const metadata: Metadata = { title: words.slip }

type Props = { params: Promise<{ workshop: string; parcel: string }> }

export default async function SlipPage({ params }: Props) {
  const { workshop: slug, parcel } = await params
  const { actor, workshop } = await packingDesk(slug, paths.packingSlip(slug, parcel))
  if (!z.uuid().safeParse(parcel).success) notFound()
  const paper = await slipsToPrint({
    actor,
    workshopId: workshop.id,
    of: { parcel },
    now: await businessNow(),
  })
  const slip = paper?.slips[0]
  if (!paper || !slip) notFound()
  return (
    <>
      <div className="print:hidden">
        <PageHead
          title={words.slip}
          trail={[{ href: paths.packingParcel(slug, parcel), label: words.parcelTitle(slip.orderNumber) }]}
          lead={words.printHint}
          aside={<a href={paths.api.packingSlip(slug, parcel)}>{words.slipPdf}</a>}
        />
      </div>
      <SlipSheet paper={paper} slip={slip} />
    </>
  )
}
