import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { InterestSheets } from '@/components/demand/interest-sheets'
import { Columns, Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { Sheet } from '@/components/ui/sheet'
import { uuid } from '@/lib/contracts/fields'
import { businessNow } from '@/lib/http/business-now'
import { demandWords as words } from '@/lib/messages/demand'
import { runWords } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getDemandBoard } from '@/lib/queries/demand/get-demand-board'
import { RunTabs } from '../_parts/run-tabs'
import { BeliefsSheet, NeededSheet } from './_parts/beliefs-sheet'
import { ChoicesSheet } from './_parts/choices-sheet'
import { ForecastSheet } from './_parts/forecast-sheet'
import { PriceSheets } from './_parts/price-sheets'

export const metadata: Metadata = { title: words.title }

type Props = { params: Promise<{ workshop: string; run: string }> }

export default async function RunDemandPage({ params }: Props) {
  const { workshop: slug, run } = await params
  const { actor, workshop } = await deskOf(slug, 'demand:read', paths.adminRunPage(slug, run, 'demand'))
  const at = { actor, workshopId: workshop.id, runId: run, now: await businessNow() }
  const board = uuid.safeParse(run).success ? await getDemandBoard(at) : null
  if (!board) notFound()
  return (
    <>
      <PageHead
        title={runWords.runTitle(board.module.name, board.run.number)}
        lead={words.lead}
        trail={[{ href: paths.adminRuns(slug), label: runWords.title }]}
      />
      <RunTabs workshop={slug} run={run} current="demand" />
      <Stack>
        <Columns>
          <ForecastSheet board={board} />
          <Stack>
            <NeededSheet board={board} />
            <Sheet title={words.invitations} id="invitations">
              <p>{words.invitationsOf(board.invitations)}</p>
            </Sheet>
            <ChoicesSheet board={board} />
          </Stack>
        </Columns>
        <BeliefsSheet board={board} />
        <PriceSheets board={board} />
        <InterestSheets board={board} csvHref={paths.api.adminRunDemand(slug, run)} />
      </Stack>
    </>
  )
}
