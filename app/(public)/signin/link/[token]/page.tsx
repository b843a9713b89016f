import type { Metadata } from 'next'
import { cookies } from 'next/headers'
import { Button, LinkButton } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { PageHead } from '@/components/ui/page-head'
import { SiteFrame } from '@/components/ui/site-frame'
import { ASKED_COOKIE } from '@/lib/auth/cookies'
import { reasonWords } from '@/lib/messages/reasons'
import { signInWords as words } from '@/lib/messages/sign-in'
import { paths } from '@/lib/paths'
import { showSignInCode } from '@/lib/services/sign-in/show-sign-in-code'

export const metadata: Metadata = {
  title: words.linkTitle,
  robots: { index: false },
}

type Props = { params: Promise<{ token: string }> }

export default async function SignInLinkPage({ params }: Props) {
  const { token } = await params
  const shown = await showSignInCode({ token, askedBy: (await cookies()).get(ASKED_COOKIE)?.value })
  if (!shown.ok)
    return (
      <SiteFrame>
        <PageHead title={words.deadTitle} lead={reasonWords(shown.reason)} />
        <LinkButton href={paths.signIn()}>{words.askAgain}</LinkButton>
      </SiteFrame>
    )
  if (!shown.value.here)
    return (
      <SiteFrame>
        <PageHead title={words.elsewhereTitle} lead={words.elsewhereLead} />
        <p className="figures text-40">{shown.value.code}</p>
      </SiteFrame>
    )
  return (
    <SiteFrame>
      <PageHead title={words.linkTitle} lead={words.linkLead} />
      <Form action={paths.api.signInCallback} hidden={{ token }} foot={<Button>{words.go}</Button>}>
        {null}
      </Form>
    </SiteFrame>
  )
}
