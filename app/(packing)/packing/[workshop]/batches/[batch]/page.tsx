import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { Button, LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { DeedForm } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { Progress } from '@/components/ui/progress'
import { isUuid } from '@/lib/contracts/fields'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { listBatches } from '@/lib/queries/packing/list-batches'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { BatchPapers } from '../../_parts/batch-papers'
import { PackedSheet } from '../../_parts/packed-sheet'
import { packingDesk } from '../../_parts/packing-desk'
import { QueueTable } from '../../_parts/queue-table'

export const metadata: Metadata = { title: words.batches.name }

type Props = {
  params: Promise<{ workshop: string; batch: string }>
  searchParams: Promise<{ draft?: string }>
}

/** One batch from the shelf to the post: what is left, what is packed, and the end. */
export default async function BatchPage({ params, searchParams }: Props) {
  const { workshop: slug, batch: batchId } = await params
  const { actor, workshop } = await packingDesk(slug, paths.packingBatch(slug, batchId))
  const asked = { actor, workshopId: workshop.id }
  const [batch] = isUuid(batchId) ? await listBatches({ ...asked, batchId }) : []
  if (!batch) notFound()
  const isOpen = batch.closedAt === null
  const { items } = await listPackQueue({ ...asked, query: { batch: batchId }, limit: 200 })
  const [first] = items
  const isAllPosted = batch.total > 0 && batch.posted === batch.total
  return (
    <>
      <PageHead
        title={batch.name}
        trail={[{ href: paths.packing(slug), label: words.title }]}
        lead={words.batch.lead(batch.packer, batch.isMine)}
      />
      <Stack>
        <OutcomeNotice form="batch" draft={(await searchParams).draft} saved={undefined} />
        {isAllPosted ? (
          <Notice kind="done" title={words.batch.allPosted}>
            {words.batch.allPostedWords(batch.total)}
          </Notice>
        ) : isOpen ? null : (
          <Notice title={words.batches.name}>{words.batch.closed}</Notice>
        )}
        <Progress label={words.batch.packed} done={batch.packed + batch.posted} total={batch.total} />
        <Progress label={words.batch.posted} done={batch.posted} total={batch.total} />
        {isOpen ? (
          <div className="flex flex-wrap items-center gap-3 print:hidden">
            {first ? (
              <LinkButton kind="primary" href={paths.packingParcel(slug, first.parcel)}>
                {words.batch.next}
              </LinkButton>
            ) : null}
            <DeedForm action={paths.api.packingBatchReturn(slug, batchId)}>
              <Button kind="secondary">{words.batch.back}</Button>
            </DeedForm>
          </div>
        ) : (
          <a href={paths.packing(slug)}>{words.batch.toQueue}</a>
        )}
        {batch.packed > 0 ? (
          <div className="print:hidden">
            <DeedForm action={paths.api.packingBatchHandOver(slug, batchId)}>
              <Button>{words.batch.handOver(batch.packed)}</Button>
            </DeedForm>
            <p className="max-w-words pt-2 text-15 text-quiet">{words.batch.handOverHint}</p>
          </div>
        ) : null}
        <BatchPapers slug={slug} query={{ batch: batchId }} />
        {isOpen ? (
          <QueueTable
            slug={slug}
            items={items}
            caption={words.batch.contains}
            empty={words.batch.nothingLeft}
          />
        ) : null}
        <PackedSheet {...asked} slug={slug} show="packed" batch={batchId} zone={workshop.timeZone} />
      </Stack>
    </>
  )
}
