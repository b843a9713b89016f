import type { Metadata } from 'next'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { runWords } from '@/lib/messages/runs'
import { unitWords as words } from '@/lib/messages/units'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { listRunUnits } from '@/lib/queries/units/list-run-units'
import { runOfPage } from '../_parts/run-of-page'
import { RunTabs } from '../_parts/run-tabs'
import { UnitForm } from './_parts/unit-form'
import { UnitTable } from './_parts/unit-table'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

export default async function RunUnitsPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const { draft, saved } = await searchParams
  const here = paths.adminRunUnits(workshop, run)
  const { actor, page } = await runOfPage({ params, deed: 'unit:read', here })
  const units = await listRunUnits({ actor, workshopId: page.workshop.id, runId: run })
  return (
    <>
      <PageHead
        title={runWords.runTitle(page.module.name, page.number)}
        trail={[{ href: paths.adminRuns(workshop), label: runWords.title }]}
        lead={words.lead}
      />
      <RunTabs workshop={workshop} run={run} current="units" />
      <Stack>
        <OutcomeNotice form="none" saved={saved} />
        <UnitTable units={units} csvHref={paths.api.adminRunUnits(workshop, run)} />
        <UnitForm
          action={paths.api.adminRunUnits(workshop, run)}
          form={keptForm(await getFormDraft(draft, 'units'))}
        />
      </Stack>
    </>
  )
}
