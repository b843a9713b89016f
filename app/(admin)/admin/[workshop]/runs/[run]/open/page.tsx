import type { Metadata } from 'next'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { CheckAnswers } from '@/components/ui/check-answers'
import { Form } from '@/components/ui/form'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { DeedPage } from '../_parts/deed-page'
import { runAnswers } from '../_parts/run-answers'
import { runOfPage } from '../_parts/run-of-page'

export const metadata: Metadata = { title: words.openTitle }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function OpenRunPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const here = paths.adminRunDeed(workshop, run, 'open')
  const { page } = await runOfPage({ params, deed: 'run:open_deposits', here })
  const kept = keptForm(await getFormDraft((await searchParams).draft, 'run-open'))
  const invited = words.openInvites(page.signUps.confirmed, page.headStartHours)
  return (
    <DeedPage page={page} title={words.openTitle} lead={words.openLead} isPossible={page.state === 'draft'}>
      <Form
        action={paths.api.adminRunDeed(workshop, run, 'open')}
        form={kept}
        foot={<Button>{words.openButton}</Button>}
      >
        <CheckAnswers
          answers={[
            ...runAnswers(page),
            { key: 'invitations', question: words.invitations, answer: invited },
            { key: 'payouts', question: words.payouts, answer: words.openPayouts },
          ]}
        />
      </Form>
    </DeedPage>
  )
}
