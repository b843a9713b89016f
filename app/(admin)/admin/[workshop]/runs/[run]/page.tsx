import type { Metadata } from 'next'
import { RunStateMark } from '@/components/run/run-state'
import { PageHead } from '@/components/ui/page-head'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { RunColumns } from './_parts/run-columns'
import { RunNotes } from './_parts/run-notes'
import { runOfPage } from './_parts/run-of-page'
import { RunTabs } from './_parts/run-tabs'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function RunPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const { page } = await runOfPage({ params, deed: 'run:read', here: paths.adminRun(workshop, run) })
  const { draft } = await searchParams
  return (
    <>
      <PageHead
        title={words.runTitle(page.module.name, page.number)}
        trail={[{ href: paths.adminRuns(workshop), label: words.title }]}
        aside={<RunStateMark state={page.state} />}
      />
      <RunTabs workshop={workshop} run={run} current="run" />
      <RunNotes page={page} />
      <RunColumns page={page} closed={await getFormDraft(draft, 'run-close')} />
    </>
  )
}
