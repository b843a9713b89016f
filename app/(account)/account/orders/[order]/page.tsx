import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { OrderState } from '@/components/order/order-state'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { isUuid } from '@/lib/contracts/fields'
import { businessNow } from '@/lib/http/business-now'
import { accountWords } from '@/lib/messages/account'
import { orderWords as words } from '@/lib/messages/order-page'
import { paths } from '@/lib/paths'
import { getOrder } from '@/lib/queries/orders/get-order'
import { InvoiceSheet } from './_parts/invoice-sheet'
import { NextSheet } from './_parts/next-sheet'
import { OrderSheet } from './_parts/order-sheet'
import { ParcelSheet } from './_parts/parcel-sheet'
import { ProblemSheet } from './_parts/problem-sheet'
import { refusalOf } from './_parts/refusal-of'
import { RefundSheet } from './_parts/refund-sheet'
import { StorySheet } from './_parts/story-sheet'

export const metadata: Metadata = { title: accountWords.orders, robots: { index: false } }

type Props = {
  params: Promise<{ order: string }>
  searchParams: Promise<{ draft?: string; paid?: string }>
}

export default async function OrderPage({ params, searchParams }: Props) {
  const { order: orderId } = await params
  const actor = await signedIn(paths.accountOrder(orderId))
  const { draft, paid } = await searchParams
  const order = isUuid(orderId) ? await getOrder({ actor, orderId, now: await businessNow() }) : null
  if (!order) notFound()
  return (
    <SignedFrame>
      <PageHead
        title={words.title(order.number, order.module.name)}
        lead={words.from(order.workshop.name)}
        trail={[{ href: paths.account, label: accountWords.title }]}
        aside={<OrderState state={order.state} />}
      />
      <Stack>
        <NextSheet order={order} hasReturned={paid !== undefined} refusal={await refusalOf(draft)} />
        <ParcelSheet order={order} />
        <ProblemSheet order={order} draft={draft} />
        <RefundSheet order={order} />
        <InvoiceSheet order={order} />
        <StorySheet order={order} />
        <OrderSheet order={order} />
      </Stack>
    </SignedFrame>
  )
}
