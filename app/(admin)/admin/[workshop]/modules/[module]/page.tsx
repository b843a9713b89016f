import type { Metadata } from 'next'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { FrontPanelDrawing } from '@/components/charts/front-panel-drawing'
import { Columns, Stack } from '@/components/ui/columns'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { loadModule, type ModulePageProps } from './_parts/load-module'
import { ModuleHead } from './_parts/module-head'
import { OffersTable } from './_parts/offers-table'
import { StateSheet } from './_parts/state-sheet'

export const metadata: Metadata = { title: words.title }

export default async function ModulePage({ params, searchParams }: ModulePageProps) {
  const { workshop, desk } = await loadModule(params)
  const { draft, saved } = await searchParams
  const { module } = desk
  return (
    <>
      <ModuleHead slug={workshop.slug} module={module} page="overview" />
      <Stack>
        <OutcomeNotice form="module-deed" draft={draft} saved={saved} />
        <StateSheet slug={workshop.slug} module={module} />
        <Columns>
          <Stack>
            {module.story ? <PlainText text={module.story} /> : null}
            <Sheet title={words.overviewTable} id="offers">
              <OffersTable slug={workshop.slug} desk={desk} currency={workshop.currency} />
            </Sheet>
            <Sheet title={words.cautionsTitle} id="cautions">
              <PlainText text={module.cautions || words.notSet} />
            </Sheet>
          </Stack>
          <FrontPanelDrawing name={module.name} widthHp={module.widthHp} controls={module.controls} />
        </Columns>
      </Stack>
    </>
  )
}
