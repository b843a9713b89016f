import type { Metadata } from 'next'
import { paths } from '@/lib/paths'
import { runWords as words } from '@/lib/messages/runs'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { DeedMails } from '../_parts/deed-mails'
import { DeedPage } from '../_parts/deed-page'
import { runOfPage } from '../_parts/run-of-page'
import { CallOffForm } from './_parts/call-off-form'

export const metadata: Metadata = { title: words.callOffTitle }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function CallOffRunPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const here = paths.adminRunDeed(workshop, run, 'call-off')
  const { actor, page } = await runOfPage({ params, deed: 'run:call_off', here })
  const kept = await getFormDraft((await searchParams).draft, 'run-call-off')
  return (
    <DeedPage
      page={page}
      title={words.callOffTitle}
      lead={words.callOffLead}
      isPossible={page.state !== 'closed' && page.state !== 'called_off'}
    >
      <CallOffForm page={page} kept={kept} />
      <DeedMails
        {...{ actor, workshopId: page.workshop.id, runId: run }}
        ahead={{ deed: 'call_off', reason: kept?.values['reason'] || words.mailReason }}
      />
    </DeedPage>
  )
}
