import { Sums } from '@/components/order/sums'
import { Button } from '@/components/ui/button'
import { CheckAnswers } from '@/components/ui/check-answers'
import { Stack } from '@/components/ui/columns'
import { DeedForm } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import type { ChangeQuoteView } from '@/lib/contracts/order-quote'
import { formatMoney } from '@/lib/core/money/format'
import { orderWords as words } from '@/lib/messages/order-page'
import { offerWords } from '@/lib/messages/public'
import { LOCALE } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'

type Props = {
  quote: ChangeQuoteView
  values: Readonly<Record<string, string>>
  draft: string
  change: string
}

/** What the change means in money and dates, and the button that makes it so. */
export function ChangeCheck({ quote, values, draft, change }: Props) {
  const { before, after, currency } = quote
  const sum = (minor: number) => formatMoney(minor, currency, LOCALE)
  const difference = after.depositMinor - before.depositMinor
  return (
    <Stack>
      <Sheet title={words.what} id="what">
        <CheckAnswers
          answers={[
            ...quote.lines.map((line) => ({
              key: line.offer,
              question: `${line.quantity} × ${offerWords[line.offer]}`,
              changeHref: change,
              answer: (
                <>
                  {sum(line.totalMinor)}, {words.promise(line.postedBy)}
                  {line.choices.map(({ question, answer }) => (
                    <span key={question} className="block text-15 text-quiet">
                      {question}: {answer}
                    </span>
                  ))}
                </>
              ),
            })),
            { key: 'before', question: words.changeBefore, answer: sum(before.totalMinor) },
            { key: 'after', question: words.changeAfter, answer: sum(after.totalMinor) },
            {
              key: 'deposit',
              question: words.changeDeposit,
              answer: words.changeFromTo(sum(before.depositMinor), sum(after.depositMinor)),
            },
          ]}
        />
      </Sheet>
      <Sheet title={words.money} id="sums">
        <Sums {...after} currency={currency} />
      </Sheet>
      <p className="max-w-words">
        {difference > 0
          ? words.changePay(sum(difference))
          : difference < 0
            ? words.changeBack(sum(-difference))
            : words.changeSame}
      </p>
      {/* The kept form names this change: pressed twice, it is one change. */}
      <DeedForm
        action={paths.api.orderChange(quote.order)}
        hidden={{ ...values, idempotencyKey: `change-${draft}` }}
      >
        <Button>{words.changeButton(difference > 0 ? sum(difference) : null)}</Button>
      </DeedForm>
    </Stack>
  )
}
