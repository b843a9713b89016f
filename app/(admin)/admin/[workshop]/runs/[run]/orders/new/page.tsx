import type { Metadata } from 'next'
import { keptForm } from '@/components/forms/kept-form'
import { businessNow } from '@/lib/http/business-now'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getOrderForm } from '@/lib/queries/orders/get-order-form'
import { DeedPage } from '../../_parts/deed-page'
import { runOfPage } from '../../_parts/run-of-page'
import { EnterForm } from './_parts/enter-form'

export const metadata: Metadata = { title: words.enter }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function EnterOrderPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const { actor, page } = await runOfPage({
    params,
    deed: 'order:enter',
    here: paths.adminOrderNew(workshop, run),
  })
  const kept = keptForm(await getFormDraft((await searchParams).draft, 'order-enter'))
  const form = await getOrderForm({
    actor,
    workshop,
    module: page.module.slug,
    now: await businessNow(),
  })
  const isPossible = (page.state === 'taking_deposits' || page.state === 'locked') && form?.run === page.id
  return (
    <DeedPage page={page} title={words.enter} lead={words.enterLead} isPossible={isPossible}>
      {form ? <EnterForm action={paths.api.adminRunOrders(workshop, run)} run={form} form={kept} /> : null}
    </DeedPage>
  )
}
