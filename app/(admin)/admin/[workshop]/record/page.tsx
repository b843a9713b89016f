import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { outcomeWords as words } from '@/lib/messages/outcome'
import { runWords } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getTrackRecord } from '@/lib/queries/record/get-track-record'
import { ConversionsSheet, RunsSheet, ScoredSheet } from './_parts/record-sheets'

export const metadata: Metadata = { title: words.recordTitle }

type Props = { params: Promise<{ workshop: string }> }

export default async function TrackRecordPage({ params }: Props) {
  const { workshop: slug } = await params
  const record = await getTrackRecord({ actor: await signedIn(paths.adminRecord(slug)), slug })
  if (!record) notFound()
  return (
    <>
      <PageHead
        title={words.recordTitle}
        lead={words.recordLead}
        trail={[{ href: paths.adminRuns(slug), label: runWords.title }]}
      />
      <Stack>
        <ConversionsSheet record={record} />
        <ScoredSheet record={record} />
        <RunsSheet record={record} slug={slug} />
      </Stack>
    </>
  )
}
