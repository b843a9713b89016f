import type { Metadata } from 'next'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { keptForm } from '@/components/forms/kept-form'
import { PageHead } from '@/components/ui/page-head'
import { workshopWords as words } from '@/lib/messages/workshops'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { StartForm } from './_parts/start-form'

export const metadata: Metadata = { title: words.startTitle }

type Props = { searchParams: Promise<{ draft?: string }> }

export default async function StartPage({ searchParams }: Props) {
  const actor = await signedIn(paths.start)
  const kept = keptForm(await getFormDraft((await searchParams).draft, 'workshop'))
  return (
    <SignedFrame>
      <PageHead title={words.startTitle} lead={words.startLead} />
      <StartForm form={kept} email={actor.email} />
    </SignedFrame>
  )
}
