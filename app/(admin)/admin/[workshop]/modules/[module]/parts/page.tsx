import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { ButtonRow, LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { dayIn } from '@/lib/core/time/zone'
import { businessNow } from '@/lib/http/business-now'
import { partsAdminWords as words } from '@/lib/messages/parts-admin'
import { paths } from '@/lib/paths'
import { getPartsDesk } from '@/lib/queries/modules-admin/get-parts-desk'
import { loadModule, type ModulePageProps } from '../_parts/load-module'
import { ModuleHead } from '../_parts/module-head'
import { PartsCheck } from '../_parts/parts-check'
import { PartsTable } from '../_parts/parts-table'
import { SampleForm } from '../_parts/sample-form'

export const metadata: Metadata = { title: words.title }

export default async function PartsPage({
  params,
  searchParams,
}: ModulePageProps<{ revision?: string; from?: string }>) {
  const { actor, workshop, desk } = await loadModule(params)
  const { draft, saved, revision, from } = await searchParams
  const at = { slug: workshop.slug, module: desk.module.slug }
  const parts = await getPartsDesk({
    actor,
    workshopId: workshop.id,
    module: at.module,
    revision,
    from: Number(from) || 0,
  })
  if (!parts) notFound()
  const to = (kind: 'lines' | 'quotes') =>
    paths.adminPartImport(at.slug, at.module, { revision: parts.revision ?? '', kind })
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
          <ButtonRow>
            <LinkButton href={to('lines')}>{words.importList}</LinkButton>
            <LinkButton kind="secondary" href={to('quotes')}>
              {words.importQuotes}
            </LinkButton>
          </ButtonRow>
          <PartsCheck parts={parts} />
          <PartsTable {...at} parts={parts} />
          <SampleForm {...at} lines={parts.samples} today={today} />
        </Stack>
      )}
    </>
  )
}
