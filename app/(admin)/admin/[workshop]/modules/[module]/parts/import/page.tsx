import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { PageHead } from '@/components/ui/page-head'
import { ImportQuery } from '@/lib/contracts/part-import'
import { importWords as words } from '@/lib/messages/part-imports'
import { partsAdminWords } from '@/lib/messages/parts-admin'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getPartsDesk } from '@/lib/queries/modules-admin/get-parts-desk'
import { getPartImport } from '@/lib/queries/part-imports/get-part-import'
import { loadModule, type ModulePageProps } from '../../_parts/load-module'
import { ImportForm } from './_parts/import-form'
import { ImportSheets } from './_parts/import-sheets'

export const metadata: Metadata = { title: words.title }

export default async function PartImportPage({ params, searchParams }: ModulePageProps) {
  const { actor, workshop, desk } = await loadModule(params)
  const { draft, ...asked } = await searchParams
  const query = ImportQuery.parse(asked)
  const at = { slug: workshop.slug, module: desk.module.slug }
  const scope = { actor, workshopId: workshop.id, module: at.module }
  const preview = query.import ? await getPartImport({ ...scope, id: query.import }) : null
  if (query.import && !preview) notFound()
  const parts = preview ? null : await getPartsDesk({ ...scope, revision: query.revision })
  const kept = async (form: string) => keptForm(await getFormDraft(draft, form))
  return (
    <>
      <PageHead
        title={`${desk.module.name}: ${words.title.toLowerCase()}`}
        lead={words.lead}
        trail={[{ href: paths.adminModulePage(at.slug, at.module, 'parts'), label: words.toParts }]}
      />
      <Stack>
        <OutcomeNotice form="module-deed" draft={draft} />
        {preview ? (
          <ImportSheets {...at} preview={preview} form={await kept('part-import-settings')} />
        ) : parts?.revision ? (
          <ImportForm {...at} parts={parts} kind={query.kind} form={await kept('part-import')} />
        ) : (
          <Empty
            action={
              <LinkButton href={paths.adminModulePage(at.slug, at.module, 'revisions')}>
                {partsAdminWords.toRevisions}
              </LinkButton>
            }
          >
            {partsAdminWords.noRevision}
          </Empty>
        )}
      </Stack>
    </>
  )
}
