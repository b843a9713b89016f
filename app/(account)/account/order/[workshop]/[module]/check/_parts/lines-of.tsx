import { Money } from '@/components/format/money'
import type { OrderQuoteView } from '@/lib/contracts/order-quote'
import { orderWords } from '@/lib/messages/order-page'
import { orderFormWords } from '@/lib/messages/orders'
import { offerWords } from '@/lib/messages/public'

/** One answer per line of the order: what, how many, its choices, its promise, what may follow on arrival. */
export function linesOf(quote: OrderQuoteView, changeHref: string) {
  return quote.lines.map((line) => ({
    key: line.offer,
    question: `${line.quantity} × ${offerWords[line.offer]}`,
    changeHref,
    answer: (
      <>
        <Money minor={line.totalMinor} currency={quote.currency} />, {orderWords.promise(line.postedBy)}
        {line.choices.map(({ question, answer }) => (
          <span key={question} className="block text-15 text-quiet">
            {question}: {answer}
          </span>
        ))}
        {line.note ? (
          <span className="block text-15 text-quiet">
            {orderFormWords.arrival}: {line.note}
          </span>
        ) : null}
      </>
    ),
  }))
}
