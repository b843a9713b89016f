import { Sums } from '@/components/order/sums'
import { AddressLines } from '@/components/parcel/address-lines'
import { Button } from '@/components/ui/button'
import { CheckAnswers } from '@/components/ui/check-answers'
import { Stack } from '@/components/ui/columns'
import { Disclosure } from '@/components/ui/disclosure'
import { DeedForm } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import type { OrderQuoteView } from '@/lib/contracts/order-quote'
import type { OrderInput } from '@/lib/contracts/orders'
import { formatAddress } from '@/lib/core/post/address'
import { orderFormWords as words } from '@/lib/messages/orders'
import { paths } from '@/lib/paths'
import { linesOf } from './lines-of'

type Props = {
  quote: OrderQuoteView
  input: OrderInput
  values: Readonly<Record<string, string>>
  draft: string
  change: string
}

/** Everything that is fixed by the button at the foot. */
export function OrderCheck({ quote, input, values, draft, change }: Props) {
  const { currency, depositMinor, balanceMinor, willWait } = quote
  const answers = [
    ...linesOf(quote, change),
    {
      key: 'address',
      question: words.address,
      answer: (
        <AddressLines lines={formatAddress(input.address, { script: 'own', from: quote.workshop.country })} />
      ),
      changeHref: change,
    },
    { key: 'balance', question: words.when, answer: words.balanceWhen[quote.balanceWhen] },
  ]
  return (
    <Stack>
      {willWait ? <Notice title={words.waitTitle}>{words.waitLead}</Notice> : null}
      <Sheet title={words.what} id="what">
        <CheckAnswers answers={answers} />
      </Sheet>
      <Sheet title={words.total} id="sums">
        <Sums {...quote} />
      </Sheet>
      <div className="flex max-w-words flex-col gap-3">
        <p>{words.condition(quote.minimum, quote.decideBy)}</p>
        <p>{words.cancelling}</p>
        {willWait ? null : <p>{words.holding(quote.holdMinutes)}</p>}
        <Disclosure summary={words.terms(quote.terms.number)}>
          <PlainText text={quote.terms.body} />
        </Disclosure>
      </div>
      {/* The kept form names this order: pressed twice, it is one order. */}
      <DeedForm action={paths.api.orders} hidden={{ ...values, idempotencyKey: draft }}>
        <Button>{willWait ? words.wait : words.order(depositMinor, balanceMinor, currency)}</Button>
      </DeedForm>
    </Stack>
  )
}
