import type { Metadata } from 'next'
import { notFound, redirect } from 'next/navigation'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { PageHead } from '@/components/ui/page-head'
import { Stack } from '@/components/ui/columns'
import { Tabs } from '@/components/ui/tabs'
import { QueueQuery } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { getPackSummary } from '@/lib/queries/packing/get-pack-summary'
import { getParcelOfOrder } from '@/lib/queries/packing/get-parcel-of-order'
import { packingDesk } from './_parts/packing-desk'
import { PackedSheet } from './_parts/packed-sheet'
import { ProgressSheet } from './_parts/progress-sheet'
import { QueueSheet } from './_parts/queue-sheet'
import { ScanForm } from './_parts/scan-form'

export const metadata: Metadata = { title: words.title }

type Search = Record<string, string | undefined>
type Props = { params: Promise<{ workshop: string }>; searchParams: Promise<Search> }

export default async function PackingPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { show, number, draft, ...search } = await searchParams
  const { actor, workshop } = await packingDesk(slug)
  const asked = { actor, workshopId: workshop.id }
  const scanned = number ? await getParcelOfOrder({ ...asked, number }) : null
  if (scanned) redirect(paths.packingParcel(slug, scanned))
  const tab = show === 'packed' || show === 'handed_over' ? show : 'queue'
  const summary = await getPackSummary(asked)
  if (!summary) notFound()
  const tabs = (['queue', 'packed', 'handed_over'] as const).map((name) => ({
    href: name === 'queue' ? paths.packing(slug) : `${paths.packing(slug)}?show=${name}`,
    label: words.tab[name],
    current: name === tab,
    count: { queue: summary.toPack, packed: summary.packed, handed_over: undefined }[name],
  }))
  return (
    <>
      <PageHead title={words.title} lead={words.queueLead(summary.toPack)} />
      <Stack>
        <OutcomeNotice form="batch" draft={draft} saved={undefined} />
        <ScanForm slug={slug} unknown={number} />
        <ProgressSheet progress={summary.progress} />
        <div>
          <Tabs label={words.tabs} tabs={tabs} />
          {tab === 'queue' ? (
            <QueueSheet
              {...asked}
              slug={slug}
              query={QueueQuery.safeParse(search).data ?? {}}
              summary={summary}
            />
          ) : (
            <PackedSheet {...asked} slug={slug} show={tab} after={search.after} zone={workshop.timeZone} />
          )}
        </div>
      </Stack>
    </>
  )
}
