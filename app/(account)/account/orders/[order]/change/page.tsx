import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { OfferRow } from '@/components/order/offer-row'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { isUuid } from '@/lib/contracts/fields'
import { businessNow } from '@/lib/http/business-now'
import { orderWords as words } from '@/lib/messages/order-page'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getOrderChange } from '@/lib/queries/orders/get-order-change'
import { keptOrder } from '../../../order/[workshop]/[module]/_parts/kept-order'

export const metadata: Metadata = { title: words.change, robots: { index: false } }

type Props = { params: Promise<{ order: string }>; searchParams: Promise<{ draft?: string }> }

export default async function ChangeOrderPage({ params, searchParams }: Props) {
  const { order: orderId } = await params
  const actor = await signedIn(paths.accountOrderChange(orderId))
  const found = isUuid(orderId) ? await getOrderChange({ actor, orderId, now: await businessNow() }) : null
  if (!found) notFound()
  const kept = keptOrder(await getFormDraft((await searchParams).draft, 'order-change'))
  const { order, run, values } = found
  return (
    <SignedFrame>
      <PageHead
        title={words.changeTitle(order.number)}
        lead={words.changeLead}
        trail={[{ href: paths.accountOrder(orderId), label: words.title(order.number, order.module.name) }]}
      />
      {run === null ? (
        <Notice title={words.change}>{words.cannotChange}</Notice>
      ) : (
        <Form
          action={paths.api.orderChangeDraft(orderId)}
          form={kept}
          foot={<Button>{words.changeNext}</Button>}
        >
          <div className="flex flex-col gap-6">
            {run.offers.map((offer, index) => (
              <OfferRow key={offer.offer} run={run} offer={offer} index={index} form={kept ?? { values }} />
            ))}
          </div>
        </Form>
      )}
    </SignedFrame>
  )
}
