import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { CheckField } from '@/components/ui/choice-field'
import { Stack } from '@/components/ui/columns'
import { Form } from '@/components/ui/form'
import { TextArea } from '@/components/ui/text-area'
import { formValues } from '@/lib/contracts/form-values'
import { dayIn } from '@/lib/core/time/zone'
import { businessNow } from '@/lib/http/business-now'
import { settingsWords as words } from '@/lib/messages/settings'
import { writtenDay } from '@/lib/messages/written'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getSettings } from '@/lib/queries/settings/get-settings'
import { SettingsHead } from '../_parts/settings-head'

export const metadata: Metadata = { title: words.pages.terms }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

export default async function TermsPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { draft, saved } = await searchParams
  const { actor, workshop } = await deskOf(slug, 'settings:read', paths.adminSettingsPage(slug, 'terms'))
  const settings = await getSettings({ actor, workshopId: workshop.id, now: await businessNow() })
  if (!settings) notFound()
  const { terms } = settings
  const beginning = { body: words.termsBeginning(workshop.name) }
  const form = keptForm(await getFormDraft(draft, 'terms')) ?? { values: formValues(terms ?? beginning) }
  const since = terms && writtenDay(dayIn(new Date(terms.publishedAt), workshop.timeZone))
  return (
    <>
      <SettingsHead slug={slug} page="terms" lead={words.termsLead} />
      <Stack>
        <OutcomeNotice form="settings-deed" saved={saved} />
        <p className="max-w-words">
          {terms && since ? words.termsNow(terms.number, since) : words.termsNone}
        </p>
        <Form
          action={paths.api.adminSettings(slug, 'terms')}
          contract="terms"
          form={form}
          foot={<Button>{words.termsPublish}</Button>}
        >
          <TextArea name="body" label={words.termsBody} rows={18} form={form} />
          <CheckField name="lapseKeepsDeposit" label={words.lapseKeepsDeposit} form={form} optional />
        </Form>
      </Stack>
    </>
  )
}
