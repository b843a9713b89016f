import type { Metadata } from 'next'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Stack } from '@/components/ui/columns'
import { Tabs } from '@/components/ui/tabs'
import { offerKind } from '@/lib/contracts/fields'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { listChoices } from '@/lib/queries/modules-admin/list-choices'
import { loadModule, type ModulePageProps } from '../_parts/load-module'
import { ModuleHead } from '../_parts/module-head'
import { ChoicesSheet } from '../_parts/choices-sheet'
import { OfferForm } from '../_parts/offer-form'
import { offerForm } from '../_parts/offer-values'

export const metadata: Metadata = { title: words.pages.offers }

export default async function OffersPage({ params, searchParams }: ModulePageProps<{ offer?: string }>) {
  const { actor, workshop, desk } = await loadModule(params)
  const { draft, saved, offer: asked } = await searchParams
  const { module } = desk
  const here = paths.adminModulePage(workshop.slug, module.slug, 'offers')
  const chosen = offerKind.safeParse(asked).data ?? desk.offers[0]?.offer ?? 'kit'
  const form = keptForm(await getFormDraft(draft, 'offer')) ?? offerForm(desk, chosen, workshop)
  return (
    <>
      <ModuleHead slug={workshop.slug} module={module} page="offers" lead={words.offersLead} />
      <Tabs
        label={words.offers}
        tabs={offerKind.options.map((offer) => ({
          href: `${here}?offer=${offer}`,
          label: offerWords[offer],
          current: offer === chosen,
        }))}
      />
      <Stack>
        <OutcomeNotice form="module-deed" draft={draft} saved={saved} />
        <OfferForm
          slug={workshop.slug}
          module={module.slug}
          offer={chosen}
          currency={workshop.currency}
          form={form}
        />
        {desk.offers.some(({ offer }) => offer === chosen) ? (
          <ChoicesSheet
            slug={workshop.slug}
            module={module.slug}
            offer={chosen}
            currency={workshop.currency}
            choices={await listChoices({ actor, workshopId: workshop.id, module: module.slug })}
            form={keptForm(await getFormDraft(draft, 'choice'))}
          />
        ) : null}
      </Stack>
    </>
  )
}
