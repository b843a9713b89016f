import { DayText } from '@/components/format/day-text'
import { Money } from '@/components/format/money'
import type { RunPage } from '@/lib/contracts/run-page'
import { runWords as words } from '@/lib/messages/runs'

/** What a run promises, to be read once more: numbers, days, prices. */
export function runAnswers(page: RunPage) {
  const { minimum, maximum, decideBy, balanceWhen, offers, currency, workshop, revision } = page
  const sum = (minor: number) => <Money minor={minor} currency={currency} locale={workshop.locale} />
  return [
    { key: 'revision', question: words.revision, answer: revision },
    { key: 'minimum', question: words.minimum, answer: minimum },
    { key: 'maximum', question: words.maximum, answer: maximum },
    { key: 'decideBy', question: words.decideBy, answer: <DayText day={decideBy} /> },
    { key: 'balanceWhen', question: words.balanceWhen, answer: words.balanceChoices[balanceWhen] },
    ...offers.map(({ offer, priceMinor, depositMinor, postedBy }) => ({
      key: offer,
      question: words.offers[offer],
      answer: (
        <>
          {sum(priceMinor)} ({words.deposit.toLowerCase()} {sum(depositMinor)}),{' '}
          {words.postedBy.toLowerCase()} <DayText day={postedBy} />
        </>
      ),
    })),
  ]
}
