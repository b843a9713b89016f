import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import { PageHead } from '@/components/ui/page-head'
import { businessNow } from '@/lib/http/business-now'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getRunTemplate } from '@/lib/queries/runs/get-run-template'
import { listRunModules } from '@/lib/queries/runs/list-run-modules'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'
import { ChooseModule } from './_parts/choose-module'
import { RunForm } from './_parts/run-form'

export const metadata: Metadata = { title: words.newTitle }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<{ module?: string; draft?: string }>
}

export default async function NewRunPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { module: asked, draft } = await searchParams
  const actor = await signedIn(paths.adminRunNew(slug))
  const workshop = await getDeskWorkshop({ actor, slug, deed: 'run:create' })
  if (!workshop) notFound()
  const modules = await listRunModules({ actor, workshopId: workshop.id })
  const module = asked ?? (modules.length === 1 ? modules[0]?.slug : undefined)
  const now = await businessNow()
  const template = module ? await getRunTemplate({ actor, workshopId: workshop.id, module, now }) : null
  if (module && !template) notFound()
  return (
    <>
      <PageHead
        title={words.newTitle}
        lead={words.newLead}
        trail={[{ href: paths.adminRuns(slug), label: words.title }]}
      />
      {template ? (
        <RunForm workshop={slug} template={template} kept={await getFormDraft(draft, 'run')} />
      ) : (
        <ChooseModule workshop={slug} modules={modules} />
      )}
    </>
  )
}
