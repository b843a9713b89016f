import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { keptForm } from '@/components/forms/kept-form'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { Sheet } from '@/components/ui/sheet'
import { env } from '@/lib/config/env'
import { businessNow } from '@/lib/http/business-now'
import { sandboxWords as words } from '@/lib/messages/sandbox'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { listSandboxPeople } from '@/lib/queries/sandbox/list-people'
import { listCards } from '@/lib/services/sandbox/list-cards'
import { CardTable } from './_parts/card-table'
import { ClockForm } from './_parts/clock-form'
import { PeopleTable } from './_parts/people-table'
import { SignInForm } from './_parts/sign-in-form'

export const metadata: Metadata = { title: words.title, robots: { index: false } }
export const dynamic = 'force-dynamic'

type Props = { searchParams: Promise<{ draft?: string }> }

export default async function SandboxPage({ searchParams }: Props) {
  const { SANDBOX, HOST_EMAILS } = env()
  if (!SANDBOX) notFound()
  const { draft } = await searchParams
  const signIn = keptForm(await getFormDraft(draft, 'sandbox-sign-in'))
  const clock = keptForm(await getFormDraft(draft, 'sandbox-clock'))
  return (
    <SignedFrame here={paths.sandbox}>
      <PageHead title={words.title} lead={words.lead} />
      <Stack>
        <Sheet title={words.signIn.title} id="sign-in">
          <SignInForm form={signIn} />
          <PeopleTable people={await listSandboxPeople(HOST_EMAILS)} />
        </Sheet>
        <Sheet title={words.clock.title} id="clock">
          <ClockForm now={await businessNow()} form={clock} />
        </Sheet>
        <Sheet title={words.mail.title} id="mail">
          <p>
            {words.mail.lead} <a href={paths.sandboxMail()}>{words.mail.open}</a>
          </p>
        </Sheet>
        <Sheet title={words.cards.title} id="cards">
          <CardTable cards={listCards()} />
        </Sheet>
        <p>
          <a href={`${paths.sandbox}/pieces`}>{words.pieces}</a>
        </p>
      </Stack>
    </SignedFrame>
  )
}
