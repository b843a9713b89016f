import type { Metadata } from 'next'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { Button } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { DeedForm } from '@/components/ui/form'
import { PageHead } from '@/components/ui/page-head'
import { hashToken } from '@/lib/config/secrets'
import { businessNow } from '@/lib/http/business-now'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'
import { getStaffInvitation } from '@/lib/queries/members/get-staff-invitation'

export const metadata: Metadata = { title: words.pages.members, robots: { index: false } }

type Props = { params: Promise<{ token: string }>; searchParams: Promise<{ draft?: string }> }

export default async function JoinPage({ params, searchParams }: Props) {
  const { token } = await params
  await signedIn(paths.join(token))
  const found = await getStaffInvitation({ tokenHash: hashToken(token), now: await businessNow() })
  return (
    <SignedFrame here={paths.join(token)}>
      {found ? (
        <>
          <PageHead
            title={words.joinTitle(found.workshop)}
            lead={words.joinLead(found.workshop, words.roles[found.role])}
          />
          <Stack>
            <OutcomeNotice form="join" draft={(await searchParams).draft} />
            <DeedForm action={paths.api.join} hidden={{ token }}>
              <Button>{words.joinAccept}</Button>
            </DeedForm>
          </Stack>
        </>
      ) : (
        <PageHead title={words.joinGoneTitle} lead={words.joinGone} />
      )}
    </SignedFrame>
  )
}
