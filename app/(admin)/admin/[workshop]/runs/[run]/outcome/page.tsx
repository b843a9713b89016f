import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { Columns, Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { uuid } from '@/lib/contracts/fields'
import { businessNow } from '@/lib/http/business-now'
import { outcomeWords as words } from '@/lib/messages/outcome'
import { runWords } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getRunOutcome } from '@/lib/queries/runs/get-run-outcome'
import { RunTabs } from '../_parts/run-tabs'
import { DatesSheet, ForecastsSheet, LearnedSheet } from './_parts/against-sheets'
import { DecisionsSheet } from './_parts/decisions-sheet'
import { MoneySheet } from './_parts/money-sheet'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

export default async function RunOutcomePage({ params, searchParams }: Props) {
  const { workshop: slug, run } = await params
  const { actor, workshop } = await deskOf(slug, 'run:read', paths.adminRunPage(slug, run, 'outcome'))
  const at = { actor, workshopId: workshop.id, runId: run, now: await businessNow() }
  const outcome = uuid.safeParse(run).success ? await getRunOutcome(at) : null
  if (!outcome) notFound()
  const { draft, saved } = await searchParams
  return (
    <>
      <PageHead
        title={runWords.runTitle(outcome.module.name, outcome.run.number)}
        lead={words.lead}
        trail={[{ href: paths.adminRuns(slug), label: runWords.title }]}
      />
      <RunTabs workshop={slug} run={run} current="outcome" />
      <Stack>
        <OutcomeNotice form="run-actuals" draft={draft} saved={saved} />
        <ForecastsSheet outcome={outcome} />
        <Columns>
          <Stack>
            <DatesSheet outcome={outcome} />
            <LearnedSheet outcome={outcome} />
          </Stack>
          <MoneySheet outcome={outcome} kept={await getFormDraft(draft, 'run-actuals')} />
        </Columns>
        <DecisionsSheet outcome={outcome} />
      </Stack>
    </>
  )
}
