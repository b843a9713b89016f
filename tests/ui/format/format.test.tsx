import { render } from '@testing-library/react'
import { expect, test } from 'vitest'
import { Count } from '@/components/format/count'
import { DayText } from '@/components/format/day-text'
import { Interval } from '@/components/format/interval'
import { Money } from '@/components/format/money'
import { Percent } from '@/components/format/percent'
import { Weight } from '@/components/format/weight'
import { When } from '@/components/format/when'
import { formatMoney } from '@/lib/core/money/format'

const textOf = (element: React.ReactElement) => render(element).container.textContent

test.each([
  [2500, 'EUR', 'en-GB'],
  [-42000, 'EUR', 'de-DE'],
  [0, 'GBP', 'en-GB'],
  [16500, 'JPY', 'ja-JP'],
  [1234567, 'CHF', 'de-CH'],
  [1, 'EUR', 'fr-FR'],
])('money is the very text of the core: %i %s %s', (minor, currency, locale) => {
  expect(textOf(<Money minor={minor} currency={currency} locale={locale} />)).toBe(
    formatMoney(minor, currency, locale),
  )
})

test('a minus stays as strong as its digits', () => {
  const { container } = render(<Money minor={-42000} currency="EUR" />)
  expect([...container.querySelectorAll('.unit')].map((part) => part.textContent).join('')).not.toMatch(
    /[-−]/,
  )
})

test('each piece writes one kind of figure', () => {
  expect(textOf(<Weight grams={1250} />)).toBe('1.250 kg')
  expect(textOf(<Percent basisPoints={2300} />)).toBe('23 %')
  expect(textOf(<Percent ratio={0.9999} />)).toBe('over 99 %')
  expect(textOf(<Interval value={66} low={57} high={76} unit="units" />)).toBe('66 units (57 to 76)')
  expect(textOf(<Interval low={57} high={76} />)).toBe('57 to 76')
  expect(textOf(<Count value={1} forms={{ one: '# order', other: '# orders' }} />)).toBe('1 order')
  expect(textOf(<Count value={1200} />)).toBe('1,200')
})

test('times are machine-readable beside their words', () => {
  const { container } = render(
    <>
      <When at="2027-03-03T13:05:00Z" zone="Europe/Berlin" />
      <DayText day="2027-03-03" />
    </>,
  )
  const stamps = [...container.querySelectorAll('time')].map((time) => time.dateTime)
  expect(stamps).toEqual(['2027-03-03T13:05:00.000Z', '2027-03-03'])
})
