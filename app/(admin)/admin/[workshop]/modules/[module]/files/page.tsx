import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Stack } from '@/components/ui/columns'
import { fileWords as words } from '@/lib/messages/files'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getFilesDesk } from '@/lib/queries/modules-admin/get-files-desk'
import { loadModule, type ModulePageProps } from '../_parts/load-module'
import { ModuleHead } from '../_parts/module-head'
import { FileForm } from './_parts/file-form'
import { FileLists } from './_parts/file-lists'

export const metadata: Metadata = { title: words.title }

export default async function FilesPage({ params, searchParams }: ModulePageProps) {
  const { actor, workshop, desk } = await loadModule(params)
  const { draft, saved } = await searchParams
  const at = { slug: workshop.slug, module: desk.module.slug }
  const files = await getFilesDesk({ actor, workshopId: workshop.id, module: at.module })
  if (!files) notFound()
  return (
    <>
      <ModuleHead slug={at.slug} module={desk.module} page="files" lead={words.lead} />
      <Stack>
        <OutcomeNotice form="module-deed" draft={draft} saved={saved} />
        <FileLists {...at} files={files.files} />
        <FileForm {...at} desk={files} form={keptForm(await getFormDraft(draft, 'file'))} />
      </Stack>
    </>
  )
}
