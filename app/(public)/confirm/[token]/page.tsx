import type { Metadata } from 'next'
import { PublicFrame } from '@/components/site/public-frame'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { PageHead } from '@/components/ui/page-head'
import { hashToken } from '@/lib/config/secrets'
import { businessNow } from '@/lib/http/business-now'
import { signUpWords as words } from '@/lib/messages/signups'
import { paths } from '@/lib/paths'
import { getLinkedSignUp } from '@/lib/queries/signups/get-linked-sign-up'
import { LinkEnded } from '../../_parts/link-ended'
import { LinkedSignUp } from '../../_parts/linked-sign-up'
import { signUpEnded } from '../../_parts/sign-up-ended'

export const metadata: Metadata = { title: words.confirmTitle, robots: { index: false } }

type Props = { params: Promise<{ token: string }>; searchParams: Promise<{ done?: string }> }

/** Looking changes nothing: mail scanners follow links. The button posts. */
export default async function ConfirmPage({ params, searchParams }: Props) {
  const { token } = await params
  const signUp = await getLinkedSignUp({ confirmTokenHash: hashToken(token) }, await businessNow())
  const ended = signUpEnded(signUp)
  if (!signUp || ended) return <LinkEnded {...ended!} />
  if (signUp.state === 'confirmed') {
    const isNew = (await searchParams).done !== undefined
    const href = paths.module(signUp.workshop.slug, signUp.module.slug)
    return (
      <LinkEnded
        title={words.confirmedTitle}
        lead={isNew ? words.confirmedLead(signUp.module.name) : words.confirmedAlready}
        way={{ href, label: words.toModule }}
      />
    )
  }
  return (
    <PublicFrame>
      <PageHead title={words.confirmTitle} lead={words.confirmLead(signUp.workshop.name)} />
      <LinkedSignUp signUp={signUp} />
      <Form action={paths.api.signUpConfirm} hidden={{ token }} foot={<Button>{words.confirm}</Button>}>
        {null}
      </Form>
    </PublicFrame>
  )
}
