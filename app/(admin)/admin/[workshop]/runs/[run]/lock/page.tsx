import type { Metadata } from 'next'
import { ReadinessList } from '@/components/run/readiness-list'
import { VerdictSheet } from '@/components/run/verdict-sheet'
import { Sheet } from '@/components/ui/sheet'
import { readinessOfPage } from '@/lib/messages/readiness'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { DeedMails } from '../_parts/deed-mails'
import { DeedPage } from '../_parts/deed-page'
import { runOfPage } from '../_parts/run-of-page'
import { LockForm } from './_parts/lock-form'

export const metadata: Metadata = { title: words.lockTitle }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function LockRunPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const here = paths.adminRunDeed(workshop, run, 'lock')
  const { actor, page } = await runOfPage({ params, deed: 'run:lock', here })
  const kept = await getFormDraft((await searchParams).draft, 'run-lock')
  const readiness = readinessOfPage(page)
  const open = readiness.filter(({ state }) => state === 'missing' || state === 'unknown')
  return (
    <DeedPage
      page={page}
      title={words.lockTitle}
      lead={words.lockLead}
      isPossible={page.state === 'taking_deposits'}
    >
      <VerdictSheet {...page} locale={page.workshop.locale} notReady={open.length} />
      <Sheet title={words.readiness}>
        <ReadinessList lines={readiness} workshop={workshop} module={page.module.slug} />
      </Sheet>
      <LockForm page={page} open={open} kept={kept} />
      <DeedMails
        {...{ actor, workshopId: page.workshop.id, runId: run }}
        ahead={{ deed: 'lock', reason: kept?.values['reason'] || words.mailReason }}
      />
    </DeedPage>
  )
}
