import type { Metadata } from 'next'
import { Empty } from '@/components/ui/empty'
import { Stack } from '@/components/ui/columns'
import { QueueQuery } from '@/lib/contracts/packing'
import { businessNow } from '@/lib/http/business-now'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { packingDesk } from '../../_parts/packing-desk'
import { PaperHead } from '../../_parts/paper-head'
import { SlipSheet } from '../../_parts/slip-sheet'
import { slipsToPrint } from '../../_parts/slips-to-print'

export const metadata: Metadata = { title: words.slipsTitle }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<Record<string, string | string[] | undefined>>
}

export default async function SlipsPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { actor, workshop } = await packingDesk(slug, paths.packingPapers(slug, 'slips'))
  const query = QueueQuery.safeParse(await searchParams).data ?? {}
  const paper = await slipsToPrint({
    actor,
    workshopId: workshop.id,
    of: { query },
    now: await businessNow(),
  })
  return (
    <>
      <PaperHead
        slug={slug}
        title={words.slipsTitle}
        pdf={paths.api.packingSlips(slug)}
        pdfWords={words.slipsPdf}
        query={query}
        isCut={paper?.isCut ?? false}
      />
      {paper ? (
        <Stack>
          {paper.slips.map((slip, index) => (
            <SlipSheet key={index} paper={paper} slip={slip} isLast={index === paper.slips.length - 1} />
          ))}
        </Stack>
      ) : (
        <Empty>{words.empty.queue}</Empty>
      )}
    </>
  )
}
