import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { PageHead } from '@/components/ui/page-head'
import { businessNow } from '@/lib/http/business-now'
import { orderFormWords as words } from '@/lib/messages/orders'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getOrderQuote } from '@/lib/queries/orders/get-order-quote'
import { OrderCheck } from './_parts/order-check'
import { readDraft } from './_parts/read-draft'

export const metadata: Metadata = { title: words.checkTitle, robots: { index: false } }

type Props = {
  params: Promise<{ workshop: string; module: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function OrderCheckPage({ params, searchParams }: Props) {
  const { workshop, module } = await params
  const back = paths.orderForm(workshop, module)
  const actor = await signedIn(back)
  const { draft } = await searchParams
  const kept = await getFormDraft(draft, 'order')
  const input = kept && readDraft(kept.values)
  // A quarter of an hour later the form is empty again, and says so.
  if (!kept || !input || draft === undefined) redirect(back)
  const quote = await getOrderQuote({ actor, input, now: await businessNow() })
  const change = `${back}?draft=${encodeURIComponent(draft)}`
  if (!quote.ok) redirect(change)
  return (
    <SignedFrame>
      <PageHead
        title={words.checkTitle}
        lead={words.checkLead(quote.value.module.name, quote.value.workshop.name)}
        trail={[{ href: change, label: words.change }]}
      />
      <OrderCheck quote={quote.value} input={input} values={kept.values} draft={draft} change={change} />
    </SignedFrame>
  )
}
