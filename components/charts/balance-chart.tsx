import { DayText } from '@/components/format/day-text'
import { Money } from '@/components/format/money'
import { Disclosure } from '@/components/ui/disclosure'
import { Table } from '@/components/ui/table'
import { formatMoney } from '@/lib/core/money/format'
import { charts } from '@/lib/messages/charts'
import { LOCALE, ui } from '@/lib/messages/ui'
import { BalancePlot } from './balance-plot'

export type BalanceChartFacts = {
  /** What is in the bank at the end of each day that moves money, in minor units. */
  series: readonly { day: string; balance: number }[]
  currency: string
  locale?: string
  low: number
  lowOn: string | null
  /** The most that can be laid out, above 0; null when not known. */
  limit: number | null
}

/** Money over time with its lowest point. Sentences above, every day in a table below. */
export function BalanceChart(facts: BalanceChartFacts) {
  const { series, currency, locale = LOCALE, low, lowOn, limit } = facts
  if (series.length === 0 || lowOn === null) return <p className="text-15 text-quiet">{charts.noBalance}</p>
  const sum = (minor: number) => formatMoney(Math.abs(minor), currency, locale)
  return (
    <figure className="@container">
      <figcaption className="max-w-words pb-2">
        <p>{low < 0 ? charts.balanceLow(sum(low), lowOn) : charts.balanceNeverLow}</p>
        {limit === null || low >= 0 ? null : (
          <p>
            {-low > limit
              ? charts.balanceBeyond(sum(-low - limit), sum(limit))
              : charts.balanceWithin(sum(limit))}
          </p>
        )}
      </figcaption>
      <BalancePlot {...facts} across="wide" />
      <BalancePlot {...facts} across="narrow" />
      <Disclosure summary={ui.inTable}>
        <Table
          caption={charts.balanceCaption}
          captionHidden
          rows={series}
          rowKey={(row) => row.day}
          empty={charts.noBalance}
          columns={[
            { key: 'day', heading: charts.day, cell: (row) => <DayText day={row.day} /> },
            {
              key: 'balance',
              heading: charts.balance,
              kind: 'figures',
              cell: (row) => <Money minor={row.balance} currency={currency} locale={locale} />,
            },
          ]}
        />
      </Disclosure>
    </figure>
  )
}
