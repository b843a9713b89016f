import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { signedIn } from '@/app/_parts/signed-in'
import { keptForm } from '@/components/forms/kept-form'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { problemWords as words } from '@/lib/messages/problems'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { listProblems } from '@/lib/queries/problems/list-problems'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'
import { AnswerForm } from './_parts/answer-form'
import { ProblemTable } from './_parts/problem-table'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<{ problem?: string; draft?: string; saved?: string }>
}

/** What buyers reported, and the answer to one of them. */
export default async function ProblemsPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { problem: chosen, draft, saved } = await searchParams
  const actor = await signedIn(paths.adminProblems(slug))
  const workshop = await getDeskWorkshop({ actor, slug, deed: 'problem:list' })
  if (!workshop) notFound()
  const problems = await listProblems({ actor, workshopId: workshop.id })
  const open = problems.find(({ problem, state }) => problem === chosen && state === 'open')
  return (
    <>
      <PageHead title={words.title} lead={words.lead} />
      <Stack>
        <OutcomeNotice form="none" saved={saved} />
        {open ? (
          <AnswerForm
            slug={slug}
            problem={open}
            form={keptForm(await getFormDraft(draft, 'answer-problem'))}
          />
        ) : null}
        <ProblemTable slug={slug} problems={problems} />
      </Stack>
    </>
  )
}
