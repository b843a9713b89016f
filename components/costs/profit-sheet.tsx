import { StepChart } from '@/components/charts/step-chart'
import { Money } from '@/components/format/money'
import { Percent } from '@/components/format/percent'
import { Facts } from '@/components/ui/facts'
import { Notice } from '@/components/ui/notice'
import { Sheet } from '@/components/ui/sheet'
import type { CostFigures } from '@/lib/contracts/cost-desk'
import { costWords as words } from '@/lib/messages/costs'
import { decision } from '@/lib/messages/decision'

/** Profit at every quantity, and break-even at today's mix beside the minimum of the run. */
export function ProfitSheet({ figures }: { figures: CostFigures }) {
  const { breakEven, minimum, maximum, currency, locale, deposited, forecast, profits } = figures
  const even = breakEven.safeFrom
  return (
    <Sheet title={words.profit} id="profit">
      <p className="pb-2 text-13 text-quiet">{decision.mixOf[figures.mixOf]}</p>
      <Facts
        facts={[
          {
            name: words.breakEven,
            value: even === null ? words.never(maximum) : words.atUnits(even),
            kind: 'figures',
          },
          { name: words.minimum, value: words.atUnits(minimum), kind: 'figures' },
          {
            name: words.expected,
            value: <Money minor={figures.expectedProfit} currency={currency} locale={locale} />,
            kind: 'figures',
          },
          {
            name: words.chanceOfLoss,
            value: <Percent ratio={figures.chanceOfLoss} />,
            kind: 'figures',
          },
        ]}
      />
      <p className="max-w-words py-2 text-13 text-quiet">{words.expectedHint}</p>
      <MinimumNotice figures={figures} />
      <StepChart
        {...{ profits, breakEven, currency, locale, minimum, maximum, deposited }}
        {...(forecast && { forecast })}
      />
    </Sheet>
  )
}

function MinimumNotice({ figures: { minimum, breakEven, profits } }: { figures: CostFigures }) {
  if ((profits[minimum - 1] ?? 0) >= 0) return null
  const isGap = breakEven.lossGaps.some(([from, to]) => minimum >= from && minimum <= to)
  if (!isGap && breakEven.safeFrom === null) return null
  return (
    <div className="pb-3">
      <Notice kind="attention" title={words.minimumTitle}>
        {isGap ? words.inGap(minimum) : words.tooLow(minimum, breakEven.safeFrom ?? minimum)}
      </Notice>
    </div>
  )
}
