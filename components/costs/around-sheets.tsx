import { BalanceChart } from '@/components/charts/balance-chart'
import { DayText } from '@/components/format/day-text'
import { Money } from '@/components/format/money'
import { Percent } from '@/components/format/percent'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { CostFigures } from '@/lib/contracts/cost-desk'
import { costWords as words } from '@/lib/messages/costs'

type Props = { figures: CostFigures }

/** Money over time against what the maker can lay out. */
export function CashSheet({ figures: { cash, currency, locale } }: Props) {
  const { series, low, lowOn, canLayOut } = cash
  return (
    <Sheet title={words.cash} id="cash">
      <BalanceChart {...{ series, low, lowOn, currency, locale }} limit={canLayOut} />
      <p className="max-w-words pt-2 text-13 text-quiet">
        {words.cashAssumes(cash.boughtOn, cash.balancesOn, cash.postedOn)}
        {canLayOut === null ? ` ${words.noLimit}` : ''}
      </p>
    </Sheet>
  )
}

/** Units to build, spares and stock, each with the reasoning in a sentence. */
export function BuildSheet({ figures: { build, currency, locale } }: Props) {
  return (
    <Sheet title={words.build} id="build">
      <ul className="flex max-w-words flex-col gap-2">
        <li>{words.starts(build)}</li>
        <li>{words.spares(build)}</li>
        <li>{words.extra(build, currency, locale)}</li>
      </ul>
    </Sheet>
  )
}

/** What a call-off costs, today and with the minimum under deposit. */
export function CallOffSheet({ figures: { callOff, currency, locale } }: Props) {
  const sum = (minor: number) => <Money minor={minor} currency={currency} locale={locale} />
  return (
    <Sheet title={words.callOff} id="call-off">
      <Facts
        facts={[
          { name: words.callOffNow, value: sum(callOff.atDeposited), kind: 'figures' },
          { name: words.callOffMinimum, value: sum(callOff.atMinimum), kind: 'figures' },
        ]}
      />
      <p className="max-w-words pt-2 text-13 text-quiet">{words.callOffHint}</p>
    </Sheet>
  )
}

/** The rates the plan exchanges at, how old they are, and the margin on top. */
export function RatesSheet({ figures: { rates, currency: own } }: Props) {
  if (rates.length === 0) return null
  return (
    <Sheet title={words.rates} id="rates">
      <Table
        caption={words.rates}
        captionHidden
        rows={rates}
        rowKey={({ currency }) => currency}
        empty={words.noRates}
        narrow="scroll"
        columns={[
          { key: 'currency', heading: words.currency, cell: ({ currency }) => `1 ${currency}` },
          { key: 'rate', heading: words.rate, kind: 'figures', cell: ({ rate }) => `${rate} ${own}` },
          {
            key: 'on',
            heading: words.on,
            cell: ({ on, ageDays }) => (
              <>
                <DayText day={on} /> <span className="text-quiet">({words.age(ageDays)})</span>
              </>
            ),
          },
          {
            key: 'margin',
            heading: words.margin,
            kind: 'figures',
            cell: ({ marginBasisPoints }) => <Percent basisPoints={marginBasisPoints} digits={1} />,
          },
        ]}
      />
    </Sheet>
  )
}
