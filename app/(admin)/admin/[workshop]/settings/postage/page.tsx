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
import { SettingsHead } from '../_parts/settings-head'
import { ZoneForm } from './_parts/zone-form'
import { ZonesTable } from './_parts/zones-table'

export const metadata: Metadata = { title: words.pages.postage }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<{ draft?: string; saved?: string; zone?: string }>
}

export default async function PostagePage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { draft, saved, zone: asked } = await searchParams
  const { actor, workshop } = await deskOf(slug, 'settings:read', paths.adminSettingsPage(slug, 'postage'))
  const settings = await getSettings({ actor, workshopId: workshop.id, now: await businessNow() })
  if (!settings) notFound()
  const zone = settings.zones.find(({ id }) => id === asked)
  const stored = zone && {
    values: formValues({ ...zone, countries: zone.countries.join(', ') }, workshop.currency),
  }
  const form = keptForm(await getFormDraft(draft, 'postage')) ?? stored ?? {}
  return (
    <>
      <SettingsHead slug={slug} page="postage" lead={words.postageLead} />
      <Stack>
        <OutcomeNotice form="settings-deed" draft={draft} saved={saved} />
        <ZonesTable slug={slug} zones={settings.zones} currency={workshop.currency} />
        <ZoneForm slug={slug} form={form} zone={zone?.id} currency={workshop.currency} />
      </Stack>
    </>
  )
}
