import type { Metadata } from 'next'
import { PublicFrame } from '@/components/site/public-frame'
import { Button, LinkButton } from '@/components/ui/button'
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

export const metadata: Metadata = { title: words.takeBackTitle, robots: { index: false } }

type Props = { params: Promise<{ token: string }> }

/** Change or take back what is confirmed; changing is signing up again, which replaces it. */
export default async function TakeBackPage({ params }: Props) {
  const { token } = await params
  const signUp = await getLinkedSignUp({ takeBackTokenHash: hashToken(token) }, await businessNow())
  const ended = signUpEnded(signUp)
  if (!signUp || ended) return <LinkEnded {...ended!} />
  const again = `${paths.module(signUp.workshop.slug, signUp.module.slug)}#interest`
  return (
    <PublicFrame>
      <PageHead title={words.takeBackTitle} lead={words.takeBackLead} />
      <LinkedSignUp signUp={signUp} />
      <p className="max-w-words pb-3 text-15 text-quiet">{words.takeBackNote}</p>
      <Form
        action={paths.api.signUpTakeBack}
        hidden={{ token }}
        foot={
          <>
            <Button kind="destructive">{words.takeBack}</Button>
            <LinkButton href={again}>{words.change}</LinkButton>
          </>
        }
      >
        {null}
      </Form>
    </PublicFrame>
  )
}
