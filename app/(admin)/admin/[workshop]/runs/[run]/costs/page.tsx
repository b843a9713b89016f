import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { LiveCosts } from '@/components/costs/live-costs'
import { keptForm } from '@/components/forms/kept-form'
import { PlanForm } from '@/components/plan/plan-form'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { CostsQuery } from '@/lib/contracts/cost-desk'
import { uuid } from '@/lib/contracts/fields'
import { businessNow } from '@/lib/http/business-now'
import { costWords as words } from '@/lib/messages/costs'
import { runWords } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getCostDesk } from '@/lib/queries/runs/get-cost-desk'
import { RunTabs } from '../_parts/run-tabs'
import { PlanNotes } from './_parts/plan-notes'
import { UnitsForm } from './_parts/units-form'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string; saved?: string; units?: string }>
}

export default async function RunCostsPage({ params, searchParams }: Props) {
  const { workshop: slug, run } = await params
  const here = paths.adminRunPage(slug, run, 'costs')
  const { actor, workshop } = await deskOf(slug, 'cost:read', here)
  const { draft, saved, ...asked } = await searchParams
  const { units } = CostsQuery.parse(asked)
  const at = { actor, workshopId: workshop.id, runId: run, units, now: await businessNow() }
  const desk = uuid.safeParse(run).success ? await getCostDesk(at) : null
  if (!desk) notFound()
  const form = keptForm(await getFormDraft(draft, 'run-plan')) ?? { values: desk.values }
  return (
    <>
      <PageHead
        title={runWords.runTitle(desk.module.name, desk.run.number)}
        lead={words.lead}
        trail={[{ href: paths.adminRuns(slug), label: runWords.title }]}
      />
      <RunTabs workshop={slug} run={run} current="costs" />
      <Stack>
        <OutcomeNotice form="run-plan" saved={saved} />
        <PlanNotes slug={slug} desk={desk} />
        <LiveCosts
          figures={desk.figures}
          tryAt={paths.api.adminRunDeed(slug, run, 'plan/try')}
          question={<UnitsForm action={here} units={units} />}
        >
          <PlanForm
            action={paths.api.adminRunDeed(slug, run, 'plan')}
            currency={desk.run.currency}
            offers={desk.offers}
            form={form}
          />
        </LiveCosts>
      </Stack>
    </>
  )
}
