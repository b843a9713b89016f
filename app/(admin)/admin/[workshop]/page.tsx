import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import { Stack } from '@/components/ui/columns'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { deskWords as words } from '@/lib/messages/desk'
import { paths } from '@/lib/paths'
import { getDesk } from '@/lib/queries/workshops/get-desk'
import { FirstStepsSheet } from './_parts/first-steps-sheet'
import { RunsSheet } from './_parts/runs-sheet'

export const metadata: Metadata = { title: words.today }

type Props = { params: Promise<{ workshop: string }> }

export default async function DeskPage({ params }: Props) {
  const { workshop: slug } = await params
  const desk = await getDesk({ actor: await signedIn(paths.admin(slug)), slug })
  if (!desk) notFound()
  return (
    <>
      <PageHead title={words.titleOf(desk.workshop.name)} lead={words.lead} />
      <Stack>
        {desk.workshop.state === 'pending' ? (
          <Notice kind="attention" title={words.pendingTitle}>
            {words.pending}
          </Notice>
        ) : null}
        {desk.workshop.state === 'suspended' ? (
          <Notice kind="stopped" title={words.suspendedTitle}>
            {words.suspended}
          </Notice>
        ) : null}
        <RunsSheet slug={slug} runs={desk.runs} />
        <FirstStepsSheet desk={desk} />
      </Stack>
    </>
  )
}
