import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { keptForm } from '@/components/forms/kept-form'
import { AddressFields } from '@/components/order/address-fields'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { isUuid } from '@/lib/contracts/fields'
import { businessNow } from '@/lib/http/business-now'
import { orderWords as words } from '@/lib/messages/order-page'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getOrder } from '@/lib/queries/orders/get-order'
import { addressValues } from '../_parts/address-values'

export const metadata: Metadata = { title: words.changeAddress, robots: { index: false } }

type Props = { params: Promise<{ order: string }>; searchParams: Promise<{ draft?: string }> }

export default async function OrderAddressPage({ params, searchParams }: Props) {
  const { order: orderId } = await params
  const actor = await signedIn(paths.accountOrderAddress(orderId))
  const order = isUuid(orderId) ? await getOrder({ actor, orderId, now: await businessNow() }) : null
  if (!order) notFound()
  const kept = keptForm(await getFormDraft((await searchParams).draft, 'address'))
  return (
    <SignedFrame>
      <PageHead
        title={words.addressTitle(order.number)}
        lead={words.addressLead}
        trail={[{ href: paths.accountOrder(orderId), label: words.title(order.number, order.module.name) }]}
      />
      {order.can.includes('address') ? (
        <Form
          action={paths.api.orderAddress(orderId)}
          contract="address"
          form={kept}
          foot={<Button>{words.addressSave}</Button>}
        >
          <AddressFields prefix="" form={kept ?? { values: addressValues(order.address) }} />
        </Form>
      ) : (
        <Notice title={words.changeAddress}>{words.cannotAddress}</Notice>
      )}
    </SignedFrame>
  )
}
