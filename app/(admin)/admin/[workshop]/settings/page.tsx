import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Stack } from '@/components/ui/columns'
import { formValues } from '@/lib/contracts/form-values'
import { businessNow } from '@/lib/http/business-now'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getSettings } from '@/lib/queries/settings/get-settings'
import { DetailsForm } from './_parts/details-form'
import { SettingsHead } from './_parts/settings-head'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

export default async function SettingsPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { draft, saved } = await searchParams
  const { actor, workshop } = await deskOf(slug, 'settings:read', paths.adminSettings(slug))
  const settings = await getSettings({ actor, workshopId: workshop.id, now: await businessNow() })
  if (!settings) notFound()
  const form = keptForm(await getFormDraft(draft, 'details')) ?? { values: formValues(settings.details) }
  return (
    <>
      <SettingsHead slug={slug} page="details" />
      <Stack>
        <OutcomeNotice form="settings-deed" saved={saved} />
        <DetailsForm slug={slug} form={form} homeRate={settings.homeRate} />
      </Stack>
    </>
  )
}
