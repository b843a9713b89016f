import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { QueueQuery } from '@/lib/contracts/packing'
import { businessNow } from '@/lib/http/business-now'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { getFulfilmentOrders } from '@/lib/queries/packing/get-fulfilment-orders'
import { ListSheet } from '../../_parts/list-sheet'
import { packingDesk } from '../../_parts/packing-desk'
import { PaperHead } from '../../_parts/paper-head'

export const metadata: Metadata = { title: words.listTitle }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<Record<string, string | string[] | undefined>>
}

export default async function FulfilmentListPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { actor, workshop } = await packingDesk(slug, paths.packingPapers(slug, 'list'))
  const query = QueueQuery.safeParse(await searchParams).data ?? {}
  const paper = await getFulfilmentOrders({ actor, workshopId: workshop.id, query, now: await businessNow() })
  if (!paper) notFound()
  return (
    <>
      <PaperHead
        slug={slug}
        title={words.listTitle}
        pdf={paths.api.packingList(slug)}
        pdfWords={words.listPdf}
        query={query}
        isCut={paper.isCut}
      />
      <ListSheet paper={paper} />
    </>
  )
}
