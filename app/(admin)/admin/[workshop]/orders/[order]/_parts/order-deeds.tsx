import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { Disclosure } from '@/components/ui/disclosure'
import { DeedForm, Form } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { formatMoney } from '@/lib/core/money/format'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { runWords } from '@/lib/messages/runs'
import { LOCALE } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'
import type { KeptForm } from '@/lib/queries/forms/get-form-draft'

type Props = { order: OrderPageView; slug: string; kept: KeptForm | null }

const CANCELLABLE = ['reserved', 'balance_due', 'paid']

/** What the owner can do with one order, each saying what it does to the buyer's money. */
export function OrderDeeds({ order, slug, kept }: Props) {
  const { state, id } = order
  const owed = formatMoney(order.paidMinor - order.refundedMinor, order.currency, LOCALE)
  const canCancel = CANCELLABLE.includes(state)
  if (state !== 'withdrawn' && state !== 'lapsed' && !canCancel) return null
  return (
    <Sheet title={runWords.deeds}>
      {state === 'withdrawn' ? (
        <Disclosure summary={words.returnSummary}>
          <div className="flex flex-col items-start gap-3">
            <p className="max-w-words">{words.returnLead}</p>
            <DeedForm action={paths.api.adminOrderDeed(slug, id, 'return')}>
              <Button kind="destructive">{words.returnButton(owed)}</Button>
            </DeedForm>
          </div>
        </Disclosure>
      ) : null}
      {state === 'lapsed' ? (
        <div className="flex flex-col items-start gap-3">
          <p className="max-w-words">{words.reinstateLead}</p>
          <DeedForm action={paths.api.adminOrderDeed(slug, id, 'reinstate')}>
            <Button kind="secondary">{words.reinstate}</Button>
          </DeedForm>
        </div>
      ) : null}
      {canCancel ? (
        <Disclosure summary={words.cancelForBuyer} open={kept !== null}>
          <Form
            action={paths.api.adminOrderDeed(slug, id, 'cancel')}
            form={keptForm(kept)}
            foot={<Button kind="destructive">{words.cancelForBuyerButton(owed)}</Button>}
          >
            <TextArea
              name="reason"
              label={words.cancelReason}
              hint={words.cancelReasonHint}
              form={keptForm(kept)}
            />
          </Form>
        </Disclosure>
      ) : null}
    </Sheet>
  )
}
