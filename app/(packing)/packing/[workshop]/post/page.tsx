import type { Metadata } from 'next'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { postWords as words } from '@/lib/messages/post'
import { packingWords } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { previewTracking } from '@/lib/services/packing/preview-tracking'
import { packingDesk } from '../_parts/packing-desk'
import { ExportSheet } from './_parts/export-sheet'
import { TrackingSheet } from './_parts/tracking-sheet'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

/** Lists to the carrier and back. */
export default async function PostPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { draft, saved } = await searchParams
  const { actor, workshop } = await packingDesk(slug, paths.packingPost(slug))
  const kept = await getFormDraft(draft, 'tracking')
  const csv = kept?.reason === 'look_first' ? kept.values.csv : undefined
  const preview = csv ? await previewTracking({ actor, workshopId: workshop.id, csv }) : null
  return (
    <>
      <PageHead
        title={words.title}
        lead={words.lead}
        trail={[{ href: paths.packing(slug), label: packingWords.title }]}
      />
      <Stack>
        <OutcomeNotice form="none" saved={saved} />
        <TrackingSheet slug={slug} kept={kept} rows={preview?.ok ? preview.value : null} />
        <ExportSheet slug={slug} />
      </Stack>
    </>
  )
}
