import type { Metadata } from 'next'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Stack } from '@/components/ui/columns'
import { formValues } from '@/lib/contracts/form-values'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { FactsForm } from '../_parts/facts-form'
import { loadModule, type ModulePageProps } from '../_parts/load-module'
import { ModuleHead } from '../_parts/module-head'

export const metadata: Metadata = { title: words.pages.facts }

export default async function FactsPage({ params, searchParams }: ModulePageProps) {
  const { workshop, desk } = await loadModule(params)
  const { draft, saved } = await searchParams
  const { module } = desk
  const form = keptForm(await getFormDraft(draft, 'module-facts')) ?? { values: formValues(module) }
  return (
    <>
      <ModuleHead slug={workshop.slug} module={module} page="facts" lead={words.factsLead} />
      <Stack>
        <OutcomeNotice form="module-deed" saved={saved} />
        <FactsForm slug={workshop.slug} module={module.slug} form={form} />
      </Stack>
    </>
  )
}
