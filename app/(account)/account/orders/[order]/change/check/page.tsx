import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { fieldsToBody } from '@/lib/contracts/form-fields'
import { isUuid } from '@/lib/contracts/fields'
import { OrderChangeInput, readOrderForm } from '@/lib/contracts/orders'
import { PageHead } from '@/components/ui/page-head'
import { businessNow } from '@/lib/http/business-now'
import { orderWords as words } from '@/lib/messages/order-page'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getChangeQuote } from '@/lib/queries/orders/get-change-quote'
import { ChangeCheck } from './_parts/change-check'

export const metadata: Metadata = { title: words.changeCheck, robots: { index: false } }

type Props = { params: Promise<{ order: string }>; searchParams: Promise<{ draft?: string }> }

export default async function CheckChangePage({ params, searchParams }: Props) {
  const { order: orderId } = await params
  const back = paths.accountOrderChange(orderId)
  const actor = await signedIn(back)
  const { draft } = await searchParams
  const kept = await getFormDraft(draft, 'order-change')
  const { body } = fieldsToBody(Object.entries(kept?.values ?? {}))
  const read = OrderChangeInput.safeParse(readOrderForm(body))
  if (!isUuid(orderId) || !kept || !read.success || draft === undefined) redirect(back)
  const quote = await getChangeQuote({ actor, orderId, input: read.data, now: await businessNow() })
  const change = `${back}?draft=${encodeURIComponent(draft)}`
  if (!quote.ok) redirect(change)
  return (
    <SignedFrame>
      <PageHead
        title={words.changeCheck}
        lead={words.changeCheckLead}
        trail={[{ href: change, label: words.changeTitle(String(quote.value.number)) }]}
      />
      <ChangeCheck quote={quote.value} values={kept.values} draft={draft} change={change} />
    </SignedFrame>
  )
}
