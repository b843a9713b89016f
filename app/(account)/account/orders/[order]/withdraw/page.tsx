import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { Button, ButtonRow, LinkButton } from '@/components/ui/button'
import { CheckAnswers } from '@/components/ui/check-answers'
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

export const metadata: Metadata = { title: words.withdraw, robots: { index: false } }

type Props = { params: Promise<{ order: string }>; searchParams: Promise<{ draft?: string }> }

export default async function WithdrawPage({ params, searchParams }: Props) {
  const { order: orderId } = await params
  const actor = await signedIn(paths.accountOrderWithdraw(orderId))
  const order = isUuid(orderId) ? await getOrder({ actor, orderId, now: await businessNow() }) : null
  if (!order) notFound()
  const kept = await getFormDraft((await searchParams).draft, 'withdraw')
  const isPossible = order.can.includes('withdraw')
  const back = formatMoney(order.paidMinor - order.refundedMinor, order.currency, LOCALE)
  const isPosted = order.state === 'posted'
  return (
    <SignedFrame>
      <PageHead
        title={words.withdrawTitle(order.number)}
        lead={isPossible ? words.withdrawLead(order.withdrawal) : words.cannotWithdraw}
        trail={[{ href: paths.accountOrder(orderId), label: words.title(order.number, order.module.name) }]}
      />
      <div className="flex flex-col gap-5">
        {kept ? (
          <Notice kind="stopped" title={words.withdraw} live>
            {reasonWords(kept.reason)}
          </Notice>
        ) : null}
        {isPossible ? (
          <CheckAnswers
            answers={[
              {
                key: 'order',
                question: words.withdrawOrder,
                answer: words.title(order.number, order.module.name),
              },
              { key: 'name', question: words.withdrawName, answer: order.address.name },
              ...(actor.kind === 'person'
                ? [{ key: 'mail', question: words.withdrawMail, answer: actor.email }]
                : []),
              {
                key: 'back',
                question: words.withdrawBack,
                answer: isPosted ? words.withdrawAfter(back) : back,
              },
            ]}
          />
        ) : null}
        {isPossible && isPosted ? <p className="max-w-words">{words.withdrawPosted}</p> : null}
        <ButtonRow>
          {isPossible ? (
            <DeedForm action={paths.api.orderWithdraw(orderId)}>
              <Button kind="destructive">{words.withdrawButton}</Button>
            </DeedForm>
          ) : null}
          <LinkButton href={paths.accountOrder(orderId)}>{words.keep}</LinkButton>
        </ButtonRow>
      </div>
    </SignedFrame>
  )
}
