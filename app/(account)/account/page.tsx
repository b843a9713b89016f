import type { Metadata } from 'next'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { businessNow } from '@/lib/http/business-now'
import { accountWords as words } from '@/lib/messages/account'
import { paths } from '@/lib/paths'
import { listOwnSignUps } from '@/lib/queries/account/list-own-sign-ups'
import { listOwnOrders } from '@/lib/queries/orders/list-own-orders'
import { OrderTable } from './_parts/order-table'
import { SignUpTable } from './_parts/sign-up-table'

export const metadata: Metadata = { title: words.title, robots: { index: false } }

type Props = { searchParams: Promise<{ after?: string }> }

export default async function AccountPage({ searchParams }: Props) {
  const actor = await signedIn(paths.account)
  const { after } = await searchParams
  const orders = await listOwnOrders({ actor, after, now: await businessNow() })
  const signUps = await listOwnSignUps({ actor })
  return (
    <SignedFrame>
      <PageHead title={words.title} lead={words.lead} />
      <Stack>
        <OrderTable orders={orders.items} next={orders.next} isFirst={after === undefined} />
        <SignUpTable signUps={signUps} />
      </Stack>
    </SignedFrame>
  )
}
