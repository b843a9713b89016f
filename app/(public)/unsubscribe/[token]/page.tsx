import type { Metadata } from 'next'
import { PublicFrame } from '@/components/site/public-frame'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { PageHead } from '@/components/ui/page-head'
import { reasonWords } from '@/lib/messages/reasons'
import { signUpWords as words } from '@/lib/messages/signups'
import { ui } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'
import { showUnsubscribe } from '@/lib/services/mails/show-unsubscribe'
import { LinkEnded } from '../../_parts/link-ended'

export const metadata: Metadata = { title: words.unsubscribeTitle, robots: { index: false } }

type Props = { params: Promise<{ token: string }>; searchParams: Promise<{ done?: string }> }

/** Asks first: a link that is only looked at ends nothing. */
export default async function UnsubscribePage({ params, searchParams }: Props) {
  const { token } = await params
  const shown = await showUnsubscribe({ token })
  if (!shown.ok) return <LinkEnded title={words.unknownTitle} lead={reasonWords(shown.reason)} />
  const sender = shown.value.workshop ?? ui.siteName
  if ((await searchParams).done !== undefined)
    return <LinkEnded title={words.unsubscribedTitle} lead={words.unsubscribed(sender)} />
  return (
    <PublicFrame>
      <PageHead title={words.unsubscribeTitle} lead={words.unsubscribeLead(sender)} />
      <Form action={paths.api.unsubscribe(token)} foot={<Button>{words.unsubscribe}</Button>}>
        {null}
      </Form>
    </PublicFrame>
  )
}
