import { formatMoney } from '@/lib/core/money/format'
import { Disclosure } from '@/components/ui/disclosure'
import { Table } from '@/components/ui/table'
import { Money } from '@/components/format/money'
import { charts } from '@/lib/messages/charts'
import { LOCALE, ui } from '@/lib/messages/ui'
import { writtenNumber } from '@/lib/messages/written'
import { StepPlot } from './step-plot'

export type StepChartFacts = {
  /** Profit in minor units at 1, 2, 3 … units. */
  profits: readonly number[]
  currency: string
  locale?: string
  minimum: number
  maximum: number
  /** Units under deposit. */
  deposited: number
  forecast?: { mean: number; low: number; high: number }
  breakEven: {
    firstProfit: number | null
    safeFrom: number | null
    lossGaps: readonly (readonly [number, number])[]
  }
}

/** Profit against quantity with its real steps. Sentences above, the figures that matter in a table below. */
export function StepChart(facts: StepChartFacts) {
  const { profits, currency, locale = LOCALE, deposited, breakEven } = facts
  if (profits.length === 0) return <p className="text-15 text-quiet">{charts.noCurve}</p>
  const now = profits[deposited - 1]
  const { firstProfit, safeFrom, lossGaps } = breakEven
  return (
    <figure className="@container">
      <figcaption className="max-w-words pb-2">
        {now === undefined ? null : (
          <p>{charts.profitAt(deposited, formatMoney(Math.abs(now), currency, locale), now < 0)}</p>
        )}
        <p>
          {firstProfit === null
            ? charts.neverProfit(profits.length)
            : charts.profitFrom(firstProfit, safeFrom, lossGaps)}
        </p>
      </figcaption>
      <StepPlot {...facts} across="wide" />
      <StepPlot {...facts} across="narrow" />
      <Disclosure summary={ui.inTable}>
        <Table
          caption={charts.stepChartCaption}
          captionHidden
          rows={pointsOf(facts)}
          rowKey={(row) => row.name}
          empty={charts.noCurve}
          columns={[
            { key: 'name', heading: charts.point, cell: (row) => row.name },
            {
              key: 'units',
              heading: charts.quantity,
              kind: 'figures',
              cell: (row) => writtenNumber(row.units),
            },
            {
              key: 'profit',
              heading: charts.profit,
              kind: 'figures',
              cell: (row) => <Money minor={row.profit} currency={currency} locale={locale} />,
            },
          ]}
        />
      </Disclosure>
    </figure>
  )
}

function pointsOf({ profits, minimum, maximum, deposited, forecast, breakEven }: StepChartFacts) {
  const named: [string, number | null | undefined][] = [
    [charts.depositsNow, deposited],
    [charts.minimum, minimum],
    [charts.breakEven, breakEven.firstProfit],
    [charts.forecastLow, forecast?.low],
    [charts.forecast, forecast ? Math.round(forecast.mean) : null],
    [charts.forecastHigh, forecast?.high],
    [charts.maximum, maximum],
  ]
  return named.flatMap(([name, units]) => {
    const profit = units ? profits[units - 1] : undefined
    return units && profit !== undefined ? [{ name, units, profit }] : []
  })
}
