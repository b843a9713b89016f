import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { PageHead } from '@/components/ui/page-head'
import { uuid } from '@/lib/contracts/fields'
import { businessNow } from '@/lib/http/business-now'
import { runWords } from '@/lib/messages/runs'
import { whatIfWords as words } from '@/lib/messages/what-ifs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getWhatIfs } from '@/lib/queries/runs/get-what-ifs'
import { RunTabs } from '../_parts/run-tabs'
import { WhatIfForm } from './_parts/what-if-form'
import { WhatIfTable } from './_parts/what-if-table'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

export default async function WhatIfsPage({ params, searchParams }: Props) {
  const { workshop: slug, run } = await params
  const { actor, workshop } = await deskOf(slug, 'cost:read', paths.adminRunPage(slug, run, 'what-ifs'))
  const { draft, saved } = await searchParams
  const at = { actor, workshopId: workshop.id, runId: run, now: await businessNow() }
  const desk = uuid.safeParse(run).success ? await getWhatIfs(at) : null
  if (!desk) notFound()
  const form = keptForm(await getFormDraft(draft, 'what-if'))
  return (
    <>
      <PageHead
        title={runWords.runTitle(desk.module.name, desk.run.number)}
        lead={words.lead}
        trail={[{ href: paths.adminRuns(slug), label: runWords.title }]}
      />
      <RunTabs workshop={slug} run={run} current="what-ifs" />
      <Stack>
        <OutcomeNotice form="what-if-removal" draft={draft} saved={saved} />
        {desk.plans.length === 0 ? (
          <Empty
            action={<LinkButton href={paths.adminRunPage(slug, run, 'costs')}>{words.toCosts}</LinkButton>}
          >
            {words.noPlan}
          </Empty>
        ) : (
          <WhatIfTable slug={slug} desk={desk} />
        )}
        {desk.canAdd ? <WhatIfForm slug={slug} desk={desk} form={form} /> : null}
      </Stack>
    </>
  )
}
