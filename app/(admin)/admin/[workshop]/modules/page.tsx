import type { Metadata } from 'next'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { LinkButton } from '@/components/ui/button'
import { PageHead } from '@/components/ui/page-head'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'
import { listModules } from '@/lib/queries/modules-admin/list-modules'
import { ModulesTable } from './_parts/modules-table'

export const metadata: Metadata = { title: words.title }

type Props = { params: Promise<{ workshop: string }> }

export default async function ModulesPage({ params }: Props) {
  const { workshop: slug } = await params
  const { actor, workshop } = await deskOf(slug, 'module:create', paths.adminModules(slug))
  return (
    <>
      <PageHead
        title={words.title}
        lead={words.lead}
        aside={<LinkButton href={paths.adminModuleNew(slug)}>{words.begin}</LinkButton>}
      />
      <ModulesTable slug={slug} rows={await listModules({ actor, workshopId: workshop.id })} />
    </>
  )
}
