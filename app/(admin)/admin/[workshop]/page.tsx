import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import { Stack } from '@/components/ui/columns'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { businessNow } from '@/lib/http/business-now'
import { deskWords as words } from '@/lib/messages/desk'
import { paths } from '@/lib/paths'
import { listToday } from '@/lib/queries/today/list-today'
import { getDesk } from '@/lib/queries/workshops/get-desk'
import { FirstStepsSheet } from './_parts/first-steps-sheet'
import { TodaySheet } from './_parts/today-sheet'
import { RunsSheet } from './_parts/runs-sheet'

export const metadata: Metadata = { title: words.today }

type Props = { params: Promise<{ workshop: string }> }

export default async function DeskPage({ params }: Props) {
  const { workshop: slug } = await params
  const actor = await signedIn(paths.admin(slug))
  const desk = await getDesk({ actor, slug })
  if (!desk) notFound()
  const items = await listToday({ actor, workshopId: desk.workshop.id, now: await businessNow() })
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
        <TodaySheet slug={slug} locale={desk.workshop.locale} items={items} />
        <RunsSheet slug={slug} runs={desk.runs} />
        <FirstStepsSheet desk={desk} />
      </Stack>
    </>
  )
}
