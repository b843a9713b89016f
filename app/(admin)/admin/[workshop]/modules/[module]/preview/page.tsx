import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { ModuleSheets } from '@/app/(public)/w/[workshop]/[module]/_parts/module-sheets'
import { Stack } from '@/components/ui/columns'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { businessNow } from '@/lib/http/business-now'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'
import { getModulePreview } from '@/lib/queries/modules-admin/get-module-preview'

export const metadata: Metadata = { title: words.preview }

type Props = { params: Promise<{ workshop: string; module: string }> }

export default async function PreviewPage({ params }: Props) {
  const { workshop: slug, module } = await params
  const here = paths.adminModulePage(slug, module, 'preview')
  const { actor, workshop } = await deskOf(slug, 'module:preview', here)
  const page = await getModulePreview({ actor, workshopId: workshop.id, module, now: await businessNow() })
  if (!page) notFound()
  // As it will be read: open, whatever the workshop's state is today.
  const shown = { ...page, workshop: { ...page.workshop, isOpen: true } }
  return (
    <>
      <PageHead
        title={page.module.name}
        lead={page.module.oneLine}
        trail={[{ href: paths.adminModule(slug, module), label: words.backToModule }]}
      />
      <Stack>
        <Notice title={words.preview}>{words.previewWords}</Notice>
        <ModuleSheets page={shown} />
      </Stack>
    </>
  )
}
