import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { formatMoney } from '@/lib/core/money/format'
import { orderWords as words } from '@/lib/messages/order-page'
import { LOCALE } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'

/** Leads to the card page, or to the bank that wants the buyer, with another card as the way round it. */
export function PayButtons({ order }: { order: OrderPageView }) {
  const isDeposit = order.state === 'awaiting_deposit'
  const isChange = order.state === 'reserved'
  const due = isChange ? order.changeToPayMinor : isDeposit ? order.depositMinor : order.balanceMinor
  const sum = formatMoney(due, order.currency, LOCALE)
  const action = paths.api.orderPay(order.id)
  const label = isChange
    ? words.pay.change(sum)
    : isDeposit
      ? words.pay.deposit(sum)
      : order.payment === 'bank_asks'
        ? words.pay.confirm(sum)
        : words.pay.balance(sum)
  return (
    <>
      <DeedForm action={action}>
        <Button>{label}</Button>
      </DeedForm>
      {order.payment === 'bank_asks' ? (
        <DeedForm action={action} hidden={{ otherCard: 'on' }}>
          <Button kind="secondary">{words.pay.otherCard}</Button>
        </DeedForm>
      ) : null}
    </>
  )
}
