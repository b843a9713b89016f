import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { PlanForm } from '@/components/plan/plan-form'
import { keptForm } from '@/components/forms/kept-form'
import { LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { businessNow } from '@/lib/http/business-now'
import { planAdminWords as words } from '@/lib/messages/plan-admin'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getPlanDesk } from '@/lib/queries/modules-admin/get-plan-desk'
import { loadModule, type ModulePageProps } from '../_parts/load-module'
import { ModuleHead } from '../_parts/module-head'
import { PlanTrial } from '../_parts/plan-trial'

export const metadata: Metadata = { title: words.title }

export default async function PlanPage({ params, searchParams }: ModulePageProps) {
  const { actor, workshop, desk } = await loadModule(params)
  const { draft, saved } = await searchParams
  const at = { slug: workshop.slug, module: desk.module.slug }
  const now = await businessNow()
  const plan = await getPlanDesk({ actor, workshopId: workshop.id, module: at.module, now })
  if (!plan) notFound()
  const form = keptForm(await getFormDraft(draft, 'plan')) ?? { values: plan.values }
  const offers = paths.adminModulePage(at.slug, at.module, 'offers')
  return (
    <>
      <ModuleHead slug={at.slug} module={desk.module} page="plan" lead={words.lead} />
      {plan.offers.length === 0 ? (
        <Empty action={<LinkButton href={offers}>{words.toOffers}</LinkButton>}>{words.offersFirst}</Empty>
      ) : (
        <Stack>
          <OutcomeNotice form="module-deed" saved={saved} />
          <PlanTrial plan={plan} />
          <PlanForm
            action={paths.api.adminModulePart(at.slug, at.module, 'plan')}
            currency={plan.currency}
            offers={plan.offers}
            form={form}
          />
        </Stack>
      )}
    </>
  )
}
