import type { Metadata } from 'next'
import { ReadinessList } from '@/components/run/readiness-list'
import { RunStateMark } from '@/components/run/run-state'
import { VerdictSheet } from '@/components/run/verdict-sheet'
import { RunLine } from '@/components/charts/run-line'
import { Columns, Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { Sheet } from '@/components/ui/sheet'
import { readinessOfPage } from '@/lib/messages/readiness'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { BulkSheet } from './_parts/bulk-sheet'
import { DeedsSheet } from './_parts/deeds-sheet'
import { FiguresSheet } from './_parts/figures-sheet'
import { GaugeSheet } from './_parts/gauge-sheet'
import { RunNotes } from './_parts/run-notes'
import { RunTabs } from './_parts/run-tabs'
import { runOfPage } from './_parts/run-of-page'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function RunPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const { page } = await runOfPage({ params, deed: 'run:read', here: paths.adminRun(workshop, run) })
  const { draft } = await searchParams
  const lowered = await getFormDraft(draft, 'run-lower-minimum')
  const closed = await getFormDraft(draft, 'run-close')
  const readiness = readinessOfPage(page)
  const notReady = readiness.filter(({ state }) => state === 'missing' || state === 'unknown').length
  return (
    <>
      <PageHead
        title={words.runTitle(page.module.name, page.number)}
        trail={[{ href: paths.adminRuns(workshop), label: words.title }]}
        aside={<RunStateMark state={page.state} />}
      />
      <RunTabs workshop={workshop} run={run} current="run" />
      <RunNotes page={page} />
      <Columns>
        <Stack>
          <GaugeSheet page={page} />
          <Sheet title={words.readiness} id="readiness">
            <p className="max-w-words pb-3 text-15 text-quiet">{words.readinessLead}</p>
            <ReadinessList lines={readiness} workshop={workshop} module={page.module.slug} />
          </Sheet>
          {page.runLine ? (
            <Sheet title={words.runLine}>
              <RunLine {...page.runLine} today={page.today} />
            </Sheet>
          ) : null}
        </Stack>
        <Stack>
          <VerdictSheet {...page} locale={page.workshop.locale} notReady={notReady} />
          <DeedsSheet page={page} lowered={lowered} closed={closed} />
          <FiguresSheet page={page} />
          <BulkSheet page={page} />
        </Stack>
      </Columns>
    </>
  )
}
