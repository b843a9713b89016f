import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { CheckAnswers } from '@/components/ui/check-answers'
import { Form } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { TextArea } from '@/components/ui/text-area'
import { TypedConfirmation } from '@/components/ui/typed-confirmation'
import type { RunPage } from '@/lib/contracts/run-page'
import { formatMoney } from '@/lib/core/money/format'
import { decision } from '@/lib/messages/decision'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import type { KeptForm } from '@/lib/queries/forms/get-form-draft'

type Kept = KeptForm | null

const ENDED = ['waiting', 'awaiting_deposit', 'reserved', 'balance_due', 'paid', 'packed']

/** The no-go: how many orders end, how much goes back, and the words typed. */
export function CallOffForm({ page, kept }: { page: RunPage; kept: Kept }) {
  const { workshop, id, module, orders, money, currency, repay } = page
  const form = keptForm(kept)
  const count = ENDED.reduce((sum, state) => sum + (orders[state] ?? 0), 0)
  const sum = (minor: number) => formatMoney(minor, currency, workshop.locale)
  return (
    <Form
      action={paths.api.adminRunDeed(workshop.slug, id, 'call-off')}
      form={form}
      foot={<Button kind="destructive">{words.callOffButton(count, sum(money.heldMinor))}</Button>}
    >
      <CheckAnswers
        answers={[
          { key: 'orders', question: words.ordersTitle, answer: words.callOffEnds(count) },
          { key: 'money', question: words.callOffPays, answer: sum(money.heldMinor) },
          {
            key: 'repay',
            question: words.repayQuestion,
            answer:
              repay.state === 'short'
                ? decision.repay.short(sum(repay.shortByMinor))
                : decision.repay[repay.state],
          },
        ]}
      />
      {repay.state === 'short' && money.heldMinor > 0 ? (
        <Notice kind="attention" title={words.repayQuestion}>
          <p>{words.callOffShort(sum(repay.shortByMinor))}</p>
        </Notice>
      ) : null}
      <TextArea name="reason" label={words.callOffReason} hint={words.callOffReasonHint} form={form} />
      <TypedConfirmation name="typed" words={words.confirmCallOff(module.slug)} form={form} />
    </Form>
  )
}
