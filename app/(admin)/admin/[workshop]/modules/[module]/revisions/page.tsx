import type { Metadata } from 'next'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Stack } from '@/components/ui/columns'
import { dayIn } from '@/lib/core/time/zone'
import { businessNow } from '@/lib/http/business-now'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { listMembers } from '@/lib/queries/members/list-members'
import { FirstUnitForm } from '../_parts/first-unit-form'
import { LessonForm } from '../_parts/lesson-form'
import { LessonsSheet } from '../_parts/lessons-sheet'
import { loadModule, type ModulePageProps } from '../_parts/load-module'
import { ModuleHead } from '../_parts/module-head'
import { RevisionForm } from '../_parts/revision-form'
import { RevisionsTable } from '../_parts/revisions-table'

export const metadata: Metadata = { title: words.pages.revisions }

export default async function RevisionsPage({ params, searchParams }: ModulePageProps) {
  const { actor, workshop, desk } = await loadModule(params)
  const { draft, saved } = await searchParams
  const now = await businessNow()
  const people = await listMembers({ actor, workshopId: workshop.id, now })
  const kept = async (form: string) => keptForm(await getFormDraft(draft, form))
  const at = { slug: workshop.slug, module: desk.module.slug }
  const unproven = desk.revisions.filter(({ firstGood }) => firstGood === null)
  return (
    <>
      <ModuleHead slug={at.slug} module={desk.module} page="revisions" lead={words.revisionsLead} />
      <Stack>
        <OutcomeNotice form="module-deed" draft={draft} saved={saved} />
        <RevisionsTable {...at} revisions={desk.revisions} zone={workshop.timeZone} />
        <RevisionForm
          {...at}
          toMend={desk.lessons
            .filter(({ mendedIn, waivedReason }) => mendedIn === null && waivedReason === null)
            .map(({ symptom }) => symptom)}
          form={await kept('revision')}
        />
        {unproven.length > 0 ? (
          <FirstUnitForm
            {...at}
            revisions={unproven.map(({ letter }) => letter)}
            people={people?.members ?? []}
            today={dayIn(now, workshop.timeZone)}
            form={await kept('first-unit')}
          />
        ) : null}
        <LessonsSheet {...at} desk={desk} />
        {desk.revisions.length > 0 ? (
          <LessonForm
            {...at}
            revisions={desk.revisions.map(({ letter }) => letter)}
            form={await kept('lesson')}
          />
        ) : null}
      </Stack>
    </>
  )
}
