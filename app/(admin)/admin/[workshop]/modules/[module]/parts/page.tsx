import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { dayIn } from '@/lib/core/time/zone'
import { businessNow } from '@/lib/http/business-now'
import { partsAdminWords as words } from '@/lib/messages/parts-admin'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getPartsDesk } from '@/lib/queries/modules-admin/get-parts-desk'
import { loadModule, type ModulePageProps } from '../_parts/load-module'
import { ModuleHead } from '../_parts/module-head'
import { PartsCheck } from '../_parts/parts-check'
import { PartsForm } from '../_parts/parts-form'
import { PartsTable } from '../_parts/parts-table'
import { SampleForm } from '../_parts/sample-form'

export const metadata: Metadata = { title: words.title }

export default async function PartsPage({ params, searchParams }: ModulePageProps<{ revision?: string }>) {
  const { actor, workshop, desk } = await loadModule(params)
  const { draft, saved, revision } = await searchParams
  const at = { slug: workshop.slug, module: desk.module.slug }
  const parts = await getPartsDesk({ actor, workshopId: workshop.id, module: at.module, revision })
  if (!parts) notFound()
  const form = keptForm(await getFormDraft(draft, 'parts')) ?? { values: { csv: parts.csv } }
  const today = dayIn(await businessNow(), workshop.timeZone)
  return (
    <>
      <ModuleHead slug={at.slug} module={desk.module} page="parts" lead={words.lead} />
      {parts.revision === null ? (
        <Empty
          action={
            <LinkButton href={paths.adminModulePage(at.slug, at.module, 'revisions')}>
              {words.toRevisions}
            </LinkButton>
          }
        >
          {words.noRevision}
        </Empty>
      ) : (
        <Stack>
          <OutcomeNotice form="module-deed" draft={draft} saved={saved} />
          <PartsCheck parts={parts} />
          <PartsTable parts={parts} />
          <SampleForm {...at} lines={parts.lines} today={today} />
          <PartsForm {...at} parts={parts} form={form} />
        </Stack>
      )}
    </>
  )
}
