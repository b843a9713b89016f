import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { OrderState } from '@/components/order/order-state'
import { StatementSheet } from '@/components/money/statement-sheet'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { isUuid } from '@/lib/contracts/fields'
import { businessNow } from '@/lib/http/business-now'
import { moneyWords } from '@/lib/messages/money-desk'
import { orderWords } from '@/lib/messages/order-page'
import { runWords } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getStatement } from '@/lib/queries/money/get-statement'
import { getOrder } from '@/lib/queries/orders/get-order'
import { OrderDeeds } from './_parts/order-deeds'
import { OrderFacts } from './_parts/order-facts'

export const metadata: Metadata = { title: moneyWords.order }

type Props = {
  params: Promise<{ workshop: string; order: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function OrderDeskPage({ params, searchParams }: Props) {
  const { workshop: slug, order: orderId } = await params
  const { actor, workshop } = await deskOf(slug, 'order:list', paths.adminOrder(slug, orderId))
  const order = isUuid(orderId) ? await getOrder({ actor, orderId, now: await businessNow() }) : null
  if (!order || order.workshop.slug !== slug) notFound()
  const statement = await getStatement({ actor, workshopId: workshop.id, orderId })
  const { draft } = await searchParams
  return (
    <>
      <PageHead
        title={orderWords.title(order.number, order.module.name)}
        trail={[{ href: paths.adminRunPage(slug, order.run, 'orders'), label: runWords.ordersTitle }]}
        aside={<OrderState state={order.state} />}
      />
      <Stack>
        <OutcomeNotice draft={draft} form="order-desk" />
        <OrderFacts order={order} />
        <OrderDeeds order={order} slug={slug} kept={await getFormDraft(draft, 'order-cancel-desk')} />
        {statement ? <StatementSheet statement={statement} zone={workshop.timeZone} /> : null}
      </Stack>
    </>
  )
}
