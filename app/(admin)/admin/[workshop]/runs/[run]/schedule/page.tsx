import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { RunLine } from '@/components/charts/run-line'
import { keptForm } from '@/components/forms/kept-form'
import { LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { PageHead } from '@/components/ui/page-head'
import { Sheet } from '@/components/ui/sheet'
import { uuid } from '@/lib/contracts/fields'
import { SlipQuery } from '@/lib/contracts/schedule'
import { businessNow } from '@/lib/http/business-now'
import { runWords } from '@/lib/messages/runs'
import { scheduleWords as words } from '@/lib/messages/schedule'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getSchedule } from '@/lib/queries/runs/get-schedule'
import { RunTabs } from '../_parts/run-tabs'
import { ClosedDaysForm } from './_parts/closed-days-form'
import { OfferDatesTable } from './_parts/offer-dates-table'
import { SlipSheet } from './_parts/slip-sheet'
import { StepsTable } from './_parts/steps-table'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string; saved?: string; step?: string; days?: string }>
}

export default async function SchedulePage({ params, searchParams }: Props) {
  const { workshop: slug, run } = await params
  const here = paths.adminRunPage(slug, run, 'schedule')
  const { actor, workshop } = await deskOf(slug, 'schedule:read', here)
  const { draft, saved, ...asked } = await searchParams
  const { step, days } = SlipQuery.parse(asked)
  const slip = step && days ? { step, days } : null
  const at = { actor, workshopId: workshop.id, runId: run, slip, now: await businessNow() }
  const desk = uuid.safeParse(run).success ? await getSchedule(at) : null
  if (!desk) notFound()
  const toPlan = (
    <LinkButton href={`${paths.adminRunPage(slug, run, 'costs')}#schedule`}>{words.edit}</LinkButton>
  )
  return (
    <>
      <PageHead
        title={runWords.runTitle(desk.module.name, desk.run.number)}
        lead={words.lead}
        trail={[{ href: paths.adminRuns(slug), label: runWords.title }]}
        aside={desk.steps.length > 0 ? toPlan : undefined}
      />
      <RunTabs workshop={slug} run={run} current="schedule" />
      <Stack>
        <OutcomeNotice form="closed-days" saved={saved} />
        {desk.runLine === null || desk.offers.length === 0 ? (
          <Empty action={toPlan}>{words.noSteps}</Empty>
        ) : (
          <>
            <OfferDatesTable desk={desk} />
            <Sheet title={words.runLine} id="run-line">
              <RunLine {...desk.runLine} today={desk.today} />
            </Sheet>
            <StepsTable desk={desk} />
            <SlipSheet desk={desk} here={here} step={step} days={days} />
          </>
        )}
        <ClosedDaysForm
          action={paths.api.adminRunDeed(slug, run, 'closed-days')}
          days={desk.closedDays}
          form={keptForm(await getFormDraft(draft, 'closed-days'))}
        />
      </Stack>
    </>
  )
}
