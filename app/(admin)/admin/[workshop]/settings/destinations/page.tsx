import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Stack } from '@/components/ui/columns'
import { businessNow } from '@/lib/http/business-now'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { listModules } from '@/lib/queries/modules-admin/list-modules'
import { getSettings } from '@/lib/queries/settings/get-settings'
import { ClosedTable } from '../_parts/closed-table'
import { DestinationForm } from '../_parts/destination-form'
import { SettingsHead } from '../_parts/settings-head'

export const metadata: Metadata = { title: words.pages.destinations }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

export default async function DestinationsPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { draft, saved } = await searchParams
  const here = paths.adminSettingsPage(slug, 'destinations')
  const { actor, workshop } = await deskOf(slug, 'settings:read', here)
  const settings = await getSettings({ actor, workshopId: workshop.id, now: await businessNow() })
  if (!settings) notFound()
  const modules = await listModules({ actor, workshopId: workshop.id })
  const form = keptForm(await getFormDraft(draft, 'destination'))
  return (
    <>
      <SettingsHead slug={slug} page="destinations" lead={words.destinationsLead} />
      <Stack>
        <OutcomeNotice form="settings-deed" saved={saved} />
        <ClosedTable rows={settings.closedDestinations} />
        <DestinationForm slug={slug} form={form} modules={modules} />
      </Stack>
    </>
  )
}
