import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { PageHead } from '@/components/ui/page-head'
import { businessNow } from '@/lib/http/business-now'
import { orderFormWords as words } from '@/lib/messages/orders'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getOrderForm } from '@/lib/queries/orders/get-order-form'
import { ClosedNotice } from './_parts/closed-notice'
import { keptOrder } from './_parts/kept-order'
import { OrderForm } from './_parts/order-form'

export const metadata: Metadata = { title: words.what, robots: { index: false } }

type Props = {
  params: Promise<{ workshop: string; module: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function OrderFormPage({ params, searchParams }: Props) {
  const { workshop, module } = await params
  const here = paths.orderForm(workshop, module)
  const actor = await signedIn(here)
  const form = await getOrderForm({ actor, workshop, module, now: await businessNow() })
  if (!form) notFound()
  const kept = keptOrder(await getFormDraft((await searchParams).draft, 'order'))
  return (
    <SignedFrame here={here}>
      <PageHead
        title={words.title(form.module.name)}
        lead={words.lead}
        trail={[{ href: paths.module(workshop, module), label: words.runTrail }]}
      />
      {form.closedBecause === null ? <OrderForm run={form} form={kept} /> : <ClosedNotice run={form} />}
    </SignedFrame>
  )
}
