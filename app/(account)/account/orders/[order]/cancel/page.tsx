import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { Button, ButtonRow, LinkButton } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { isUuid } from '@/lib/contracts/fields'
import { formatMoney } from '@/lib/core/money/format'
import { businessNow } from '@/lib/http/business-now'
import { orderWords as words } from '@/lib/messages/order-page'
import { reasonWords } from '@/lib/messages/reasons'
import { LOCALE } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getOrder } from '@/lib/queries/orders/get-order'

export const metadata: Metadata = { title: words.cancel, robots: { index: false } }

type Props = { params: Promise<{ order: string }>; searchParams: Promise<{ draft?: string }> }

export default async function CancelOrderPage({ params, searchParams }: Props) {
  const { order: orderId } = await params
  const actor = await signedIn(paths.accountOrderCancel(orderId))
  const order = isUuid(orderId) ? await getOrder({ actor, orderId, now: await businessNow() }) : null
  if (!order) notFound()
  const kept = await getFormDraft((await searchParams).draft, 'cancel')
  const isLeaving = order.can.includes('leave')
  const isPossible = isLeaving || order.can.includes('cancel')
  const owed = order.paidMinor - order.refundedMinor
  const sum = owed > 0 ? formatMoney(owed, order.currency, LOCALE) : null
  return (
    <SignedFrame>
      <PageHead
        title={isLeaving ? words.leave : words.cancelTitle(order.number)}
        lead={isPossible ? words.cancelLead : words.cannotCancel}
        trail={[{ href: paths.accountOrder(orderId), label: words.title(order.number, order.module.name) }]}
      />
      <div className="flex flex-col gap-5">
        {kept ? (
          <Notice kind="stopped" title={words.cancel} live>
            {reasonWords(kept.reason)}
          </Notice>
        ) : null}
        {isPossible ? (
          <p>
            {sum === null ? words.cancelNothing : words.cancelBack(sum)} {isLeaving ? '' : words.cancelPlace}
          </p>
        ) : null}
        <ButtonRow>
          {isPossible ? (
            <DeedForm action={paths.api.orderCancel(orderId)}>
              <Button kind="destructive">
                {isLeaving ? words.leaveButton(order.number) : words.cancelButton(order.number, sum)}
              </Button>
            </DeedForm>
          ) : null}
          <LinkButton href={paths.accountOrder(orderId)}>{words.keep}</LinkButton>
        </ButtonRow>
      </div>
    </SignedFrame>
  )
}
