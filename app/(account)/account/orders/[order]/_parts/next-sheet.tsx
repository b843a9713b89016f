import { CheckPayment } from '@/components/order/check-payment'
import { AddressLines } from '@/components/parcel/address-lines'
import { Button, ButtonRow, LinkButton } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { formatMoney } from '@/lib/core/money/format'
import { orderWords as words } from '@/lib/messages/order-page'
import { refusedTitle } from '@/lib/messages/reasons/general'
import { LOCALE } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'
import { NextWords } from './next-words'
import { PayButtons } from './pay-buttons'

type Props = {
  order: OrderPageView
  /** Back from the card page. */
  hasReturned: boolean
  refusal: string | null
}

/** What is next, and what can be done about it. */
export function NextSheet({ order, hasReturned, refusal }: Props) {
  const isWaited = (hasReturned && order.payment !== 'none') || order.payment === 'unknown'
  const can = (deed: OrderPageView['can'][number]) => order.can.includes(deed)
  return (
    <Sheet title={words.next} id="next">
      <div className="flex flex-col gap-5">
        {refusal === null ? null : (
          <Notice kind="stopped" title={refusedTitle} live>
            {refusal}
          </Notice>
        )}
        {isWaited && can('pay') ? (
          <Notice title={words.checking.title} live>
            <p>{hasReturned ? words.checking.lead : words.checking.unknown}</p>
            {hasReturned ? <CheckPayment order={order.id} state={order.state} /> : null}
            <DeedForm action={paths.api.orderPaid(order.id)}>
              <Button kind="secondary">{words.checking.button}</Button>
            </DeedForm>
          </Notice>
        ) : null}
        {order.isDisputed ? (
          <Notice kind="attention" title={words.next}>
            {words.nextFor.disputed}
          </Notice>
        ) : null}
        <NextWords order={order} />
        {order.state === 'withdrawn' && order.returnTo.length > 0 ? (
          <div>
            <p className="text-15 text-quiet">{words.sendBack}</p>
            <AddressLines lines={order.returnTo} />
          </div>
        ) : null}
        {order.changeToPayMinor > 0 ? (
          <p>{words.changeOpen(formatMoney(order.changeToPayMinor, order.currency, LOCALE))}</p>
        ) : null}
        {order.runReason && order.runState === 'called_off' ? (
          <div>
            <p className="text-15 text-quiet">{words.reason}</p>
            <PlainText text={order.runReason} />
          </div>
        ) : null}
        <ButtonRow>
          {can('pay') ? <PayButtons order={order} /> : null}
          {can('change') ? (
            <LinkButton href={paths.accountOrderChange(order.id)}>{words.change}</LinkButton>
          ) : null}
          {can('address') ? (
            <LinkButton href={paths.accountOrderAddress(order.id)}>{words.changeAddress}</LinkButton>
          ) : null}
          {can('withdraw') ? (
            <LinkButton kind="plain" href={paths.accountOrderWithdraw(order.id)}>
              {words.withdraw}
            </LinkButton>
          ) : null}
          {can('cancel') || can('leave') ? (
            <LinkButton kind="plain" href={paths.accountOrderCancel(order.id)}>
              {can('leave') ? words.leave : words.cancel}
            </LinkButton>
          ) : null}
        </ButtonRow>
      </div>
    </Sheet>
  )
}
